import { type ChildProcess, spawn } from 'node:child_process'
import { root } from '@/lib/start/root.mjs'

/** Runs lines of JavaScript as a module in a Node process of its own, in the project's folder. */
export function runModule(lines: string): ChildProcess {
  return spawn(process.execPath, ['--input-type=module', '-e', lines], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'inherit'],
  })
}

/** Waits until the process has written the words. */
export function hears(child: ChildProcess, words: string): Promise<void> {
  return new Promise((resolve, reject) => {
    let said = ''
    child.stdout?.on('data', (part) => {
      said += part
      if (said.includes(words)) resolve()
    })
    child.once('exit', () => reject(new Error(`It ended without saying "${words}": ${said}`)))
  })
}

/** Waits for the end of a process. */
export const ends = (child: ChildProcess): Promise<number | null> =>
  new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) resolve(child.exitCode)
    else child.once('exit', resolve)
  })
