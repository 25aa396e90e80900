import { execFileSync } from 'node:child_process'

/** The tests run the real command, so the bundle under `dist/` is made from the sources at hand first. */
export default function buildOnce(): void {
  execFileSync('npm', ['run', 'build'], { stdio: ['ignore', 'ignore', 'inherit'] })
}
