/** A result that cannot be written where it was asked for. */
export class OutputError extends Error {
  constructor(
    readonly path: string,
    reason: string,
    readonly next: string,
  ) {
    super(`${path}: ${reason}`)
    this.name = 'OutputError'
  }
}

interface Explanation {
  readonly reason: string
  readonly next: string
}

const ELSEWHERE = 'name another folder with --out'

const EXPLANATIONS: Readonly<Record<string, Explanation>> = {
  ENOSPC: { reason: 'the disk is full', next: 'make room, or name a folder on another disk with --out' },
  EDQUOT: {
    reason: 'your quota on this disk is used up',
    next: 'make room, or name a folder on another disk with --out',
  },
  EFBIG: { reason: 'the file would be larger than allowed here', next: ELSEWHERE },
  EACCES: { reason: 'no permission to write here', next: ELSEWHERE },
  EPERM: { reason: 'no permission to write here', next: ELSEWHERE },
  EROFS: { reason: 'the disk is read-only', next: ELSEWHERE },
  ENOTDIR: { reason: 'a part of the path is a file, not a folder', next: ELSEWHERE },
  EISDIR: { reason: 'a folder of this name is in the way', next: 'move it, or name another folder with --out' },
  EEXIST: { reason: 'a file of this name is in the way', next: 'move it, or name another folder with --out' },
  ENOENT: { reason: 'the folder does not exist', next: 'make the folder first' },
  ENAMETOOLONG: { reason: 'the name is too long', next: 'choose a shorter name' },
}

/** What the system's error means to the user; an error that is not the system's is passed on as it is. */
export function outputErrorFrom(error: unknown, path: string): unknown {
  if (!(error instanceof Error && 'code' in error && typeof error.code === 'string')) return error
  const known = EXPLANATIONS[error.code]
  return new OutputError(path, known?.reason ?? error.message, known?.next ?? ELSEWHERE)
}
