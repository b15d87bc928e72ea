// @ts-check
// Computes a study file without database or server; what it prints is the command's own, so that scripts can read it.
import './node-version.mjs'
import { spawn } from 'node:child_process'
import { bundleOf } from './entries.mjs'
import { runCommand } from './failure.mjs'
import { preparePrograms } from './prepare.mjs'

await runCommand(async () => {
  await preparePrograms((line) => process.stderr.write(`${line}\n`))
  // a process of its own, in the folder the caller is in: paths in the arguments are the caller's
  const cwd = process.env.INIT_CWD ?? process.cwd()
  const child = spawn(process.execPath, [bundleOf('study'), ...process.argv.slice(2)], { stdio: 'inherit', cwd })
  for (const signal of /** @type {NodeJS.Signals[]} */ (['SIGINT', 'SIGTERM']))
    process.on(signal, () => child.kill(signal))
  process.exitCode = await new Promise((resolve) => child.once('exit', (status) => resolve(status ?? 1)))
})
