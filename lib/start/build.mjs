// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from './failure.mjs'
import { inRoot } from './root.mjs'
import { lastLines, runNode } from './run-step.mjs'
import { stampOf } from './stamp.mjs'
import { toolPath } from './tools.mjs'

/** How many finished builds are kept: a running server may still read from the one before. */
const kept = 2

const builds = inRoot('.build')

/** @returns {string} folder of the build that the present sources have or would get */
function folderOfSources() {
  const stamp = stampOf({
    paths: [
      'app',
      'lib',
      'prisma/schema',
      'proxy.ts',
      'instrumentation.ts',
      'next.config.js',
      'tsconfig.json',
      '.postcssrc.json',
      'package-lock.json',
    ],
    // what only runs before or beside the application does not change it
    except: ['lib/start', 'lib/cli'],
    words: [process.versions.node.split('.')[0] ?? ''],
  })
  return path.join(builds, stamp)
}

/** Puts aside all but the newest builds. @param {string} current */
function removeOld(current) {
  const others = fs
    .readdirSync(builds)
    .map((name) => path.join(builds, name))
    .filter((folder) => folder !== current)
    .sort((a, b) => fs.statSync(b).mtimeMs - fs.statSync(a).mtimeMs)
  for (const folder of others.slice(kept - 1)) fs.rmSync(folder, { recursive: true, force: true })
}

/**
 * Builds the application unless its sources are unchanged. A build is moved to a folder named after its sources once it is
 * complete: a killed build leaves nothing that could be served, and a later build does not disturb a running server.
 * @param {(line: string) => void} say
 * @returns {Promise<string>} absolute path of the server to run
 */
export async function ensureBuild(say) {
  const folder = folderOfSources()
  const server = path.join(folder, 'server.js')
  if (fs.existsSync(server)) {
    fs.utimesSync(folder, new Date(), new Date())
    return server
  }
  say('Building the application (a minute or so)')
  const outcome = await runNode([toolPath('next'), 'build'], { NODE_ENV: 'production' })
  if (outcome.status !== 0) {
    throw new Failure(`${lastLines(outcome)}\nThe application could not be built: correct the source above.`)
  }
  const standalone = inRoot('.next', 'standalone')
  fs.cpSync(inRoot('.next', 'static'), path.join(standalone, '.next', 'static'), { recursive: true })
  // settings are read from the project's own .env at each start; a copy here would outlive a change
  for (const name of fs.readdirSync(standalone)) {
    if (name.startsWith('.env')) fs.rmSync(path.join(standalone, name))
  }
  fs.mkdirSync(builds, { recursive: true })
  fs.renameSync(standalone, folder)
  removeOld(folder)
  return server
}
