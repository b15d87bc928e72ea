// @ts-check
import { inRoot } from './root.mjs'

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
  // not asked of the resolver: some of these packages do not let their files be named
  return inRoot('node_modules', ...(programs[name] ?? []))
}
