import { type ChildProcess, spawn } from 'node:child_process'
import { mkdtempSync, readdirSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { onTestFinished } from 'vitest'
import { ROOT } from '../sourceFiles.js'

const BIN = join(ROOT, 'bin', 'offblack.js')

export interface Outcome {
  readonly code: number | null
  readonly stdout: string
  readonly stderr: string
}

/** Runs the real command to its end. */
export function offblack(args: readonly string[], cwd: string, env: NodeJS.ProcessEnv = {}): Promise<Outcome> {
  return outcomeOf(startOffblack(args, cwd, env))
}

export function startOffblack(args: readonly string[], cwd: string, env: NodeJS.ProcessEnv = {}): ChildProcess {
  const { NO_COLOR: _, FORCE_COLOR: __, ...inherited } = process.env
  return spawn(process.execPath, [BIN, ...args], { cwd, env: { ...inherited, ...env } })
}

export function outcomeOf(child: ChildProcess): Promise<Outcome> {
  return new Promise((resolve) => {
    let stdout = ''
    let stderr = ''
    child.stdout?.setEncoding('utf8').on('data', (text) => {
      stdout += text
    })
    child.stderr?.setEncoding('utf8').on('data', (text) => {
      stderr += text
    })
    child.on('close', (code) => resolve({ code, stdout, stderr }))
  })
}

/** An empty folder for one test, with the demo stacks under `stacks/` and the files given. */
export function workFolder(files: Readonly<Record<string, string>> = {}): string {
  const folder = mkdtempSync(join(tmpdir(), 'offblack-test-'))
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }))
  symlinkSync(join(ROOT, 'stacks'), join(folder, 'stacks'))
  for (const [name, text] of Object.entries(files)) writeFileSync(join(folder, name), text)
  return folder
}

/** Names in a work folder, but for the demo stacks. */
export function namesIn(folder: string): string[] {
  return readdirSync(folder)
    .filter((name) => name !== 'stacks')
    .sort()
}
