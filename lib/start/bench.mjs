// @ts-check
// Measures and prints figures; with --json one object of them, so that runs can be compared.
import './node-version.mjs'
import { bundleOf } from './entries.mjs'
import { Failure, runCommand } from './failure.mjs'
import { anyFreePort } from './port.mjs'
import { prepareApplication, preparePrograms } from './prepare.mjs'
import { inRoot } from './root.mjs'
import { lastLines, runNode } from './run-step.mjs'
import { runUntilStopped } from './undo-list.mjs'

/** What is being prepared goes to the other stream: the figures alone are the result. @param {string} line */
const say = (line) => process.stderr.write(`${line}\n`)

const asJson = process.argv.includes('--json')
const page = '/sign-in'

await runCommand(() =>
  runUntilStopped(say, async (undo) => {
    await preparePrograms(say)
    // built first: the figures of the pages are read from the newest build
    await prepareApplication(say)
    const outcome = await runNode([bundleOf('bench'), ...process.argv.slice(2)])
    if (outcome.status !== 0)
      throw new Failure(`${lastLines(outcome)}\nThe figures could not be measured: the lines above say why.`)
    const { serveFresh } = await import('./testing/serve-fresh.mjs')
    const { engineSize } = await import('./testing/engine-size.mjs')
    const { scriptsOf } = await import('./testing/page-weight.mjs')
    const peopleFile = inRoot('.data', 'test', 'bench-people.json')
    const address = await serveFresh({ port: await anyFreePort(), peopleFile, say, undo })
    const { files, kilobytes } = await scriptsOf(address, page)
    const name = `first page ${page}: script as sent, compressed`
    const value = Number(kilobytes.toPrecision(4))
    const { gzip, brotli } = await engineSize()
    const engine = { gzip: Number((gzip / 1000).toPrecision(4)), brotli: Number((brotli / 1000).toPrecision(4)) }
    if (asJson) {
      const measured = JSON.parse(outcome.stdout)
      measured.figures[name] = { value, unit: 'kB' }
      measured.figures[`first page ${page}: script files`] = { value: files, unit: '1' }
      for (const [way, size] of Object.entries(engine))
        measured.figures[`whole engine, ${way}`] = { value: size, unit: 'kB' }
      process.stdout.write(`${JSON.stringify(measured)}\n`)
    } else {
      process.stdout.write(
        `${outcome.stdout}${name}  ${value} kB in ${files} files\nwhole engine  ${engine.gzip} kB by gzip, ${engine.brotli} kB by brotli\n`,
      )
    }
  }),
)
process.exit()
