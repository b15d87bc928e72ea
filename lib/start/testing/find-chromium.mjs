// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from '../failure.mjs'

const names = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome']

/** @param {string} searchPath @returns {string | undefined} */
const onPath = (searchPath) =>
  searchPath
    .split(path.delimiter)
    .flatMap((folder) => names.map((name) => path.join(folder, name)))
    .find((file) => fs.existsSync(file))

/**
 * The browser of the browser tests: the one in `CHROMIUM`, the system's, or the one Playwright installed.
 * @param {Record<string, string | undefined>} env
 * @param {() => Promise<string>} playwrights where Playwright would put its own
 * @returns {Promise<string>}
 */
export async function findChromium(env, playwrights) {
  if (env.CHROMIUM) {
    if (fs.existsSync(env.CHROMIUM)) return env.CHROMIUM
    throw new Failure(`CHROMIUM names "${env.CHROMIUM}", where there is no program: correct it or leave it out.`)
  }
  const system = onPath(env.PATH ?? '')
  if (system) return system
  const own = await playwrights()
  if (fs.existsSync(own)) return own
  throw new Failure(
    'The browser tests need Chromium: install it ("apt-get install chromium", or "npx playwright install chromium"), or set CHROMIUM to its path.',
  )
}
