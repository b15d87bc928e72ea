// @ts-check
import { createRequire } from 'node:module'
import path from 'node:path'

const require = createRequire(import.meta.url)

/** @type {Record<string, [string, string]>} the program a tool's package holds, run with our Node and without a shell */
const programs = {
  prisma: ['prisma', 'build/index.js'],
  next: ['next', 'dist/bin/next'],
  tsc: ['typescript', 'bin/tsc'],
  biome: ['@biomejs/biome', 'bin/biome'],
  knip: ['knip', 'bin/knip.js'],
  vitest: ['vitest', 'vitest.mjs'],
  playwright: ['@playwright/test', 'cli.js'],
}

/** @param {keyof typeof programs} name @returns {string} absolute path */
export function toolPath(name) {
  const [packageName, program] = programs[name] ?? ['', '']
  return path.join(path.dirname(require.resolve(`${packageName}/package.json`)), program)
}
