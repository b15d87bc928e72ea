// @ts-check
import './node-version.mjs'
import { runCommand } from './failure.mjs'
import { choosePort } from './port.mjs'
import { prepareApplication, preparePrograms } from './prepare.mjs'
import { showNode } from './run-step.mjs'
import { runUntilStopped } from './undo-list.mjs'

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`)

/** @param {ReturnType<import('./undo-list.mjs').undoList>} undo */
async function testEverything(undo) {
  // whatever database the person uses, the tests have their own
  for (const name of ['DATABASE_URL', 'TEST_CLUSTER_URL', 'DATA_DIR', 'PORT', 'HOST', 'BASE_URL'])
    delete process.env[name]
  await preparePrograms(say)
  const { stages } = await import('./testing/stages.mjs')
  const checks = await import('./testing/checks.mjs')
  const { countListed, countPlaywright, countVitest } = await import('./testing/counts.mjs')
  const { findChromium } = await import('./testing/find-chromium.mjs')
  const { joinTestCluster, leaveTestCluster } = await import('./testing/cluster.mjs')
  const { ensureTemplate } = await import('./testing/template.mjs')
  const { toolPath } = await import('./tools.mjs')
  const parts = stages(say)

  await parts.run('types', checks.checkTypes)
  await parts.run('style and import rules', checks.checkStyle)
  await parts.run('unused code and packages', checks.checkUnused)
  let server = ''
  const migrated = await parts.run('migrations on an empty database', async () => {
    const cluster = await joinTestCluster()
    undo.add(() => leaveTestCluster(cluster))
    server = cluster.ownerUrl('postgres')
    await ensureTemplate(server)
    return { passed: 1, failed: 0 }
  })
  if (migrated) await parts.run('migrations make the schema', () => checks.checkDrift(server))
  // before the unit tests: one of them serves it
  const built = await parts.run('build', async () => {
    await prepareApplication(say)
    return { passed: 1, failed: 0 }
  })
  await parts.run('unit and integration tests', async () => {
    const report = checks.freshReport('vitest.json')
    const args = [
      'run',
      '--config=test/vitest.config.ts',
      '--reporter=default',
      '--reporter=json',
      `--outputFile=${report}`,
    ]
    const status = await showNode([toolPath('vitest'), ...args], server ? { TEST_CLUSTER_URL: server } : {})
    return countVitest(report, status)
  })
  await parts.run('browser tests', async () => {
    const report = checks.freshReport('playwright.json')
    const playwright = [toolPath('playwright'), 'test', '--config=e2e/playwright.config.ts']
    const env = { PLAYWRIGHT_JSON_OUTPUT_NAME: report }
    const cannotRun = async (/** @type {string} */ note) => {
      await checks.checkWith([...playwright, '--list', '--reporter=json'], { env })
      return { passed: 0, failed: countListed(report), note }
    }
    if (!built) return cannotRun('There is no build to test.')
    try {
      const { chromium } = await import('@playwright/test')
      const browser = await findChromium(process.env, async () => chromium.executablePath())
      const port = process.env.E2E_PORT || String(await choosePort({ host: '127.0.0.1', first: 4310 }))
      const how = { ...env, CHROMIUM: browser, E2E_PORT: port }
      const status = await showNode([...playwright, '--reporter=list,json'], how)
      return countPlaywright(report, status)
    } catch (error) {
      return cannotRun(error instanceof Error ? error.message : String(error))
    }
  })

  await undo.end()
  const { passed, failed } = parts.total()
  say(`\n${parts.summary().join('\n')}\n`)
  say(`${passed} passed, ${failed} failed`)
  process.exitCode = failed === 0 ? 0 : 1
}

await runCommand(() => runUntilStopped(say, testEverything))
process.exit()
