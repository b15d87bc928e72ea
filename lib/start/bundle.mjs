// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { sortEntries } from './entries.mjs'
import { Failure } from './failure.mjs'
import { inRoot, root } from './root.mjs'
import { readStamp, stampOf, writeStamp } from './stamp.mjs'

/** @returns {import('esbuild').BuildOptions} how every program for Node is bundled: our code in one file, packages outside */
export function bundleOptions() {
  return {
    absWorkingDir: root,
    entryPoints: sortEntries().present,
    outdir: inRoot('.jobs'),
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    // the mark of server code is answered by the framework; outside it there is nothing to guard
    alias: { 'server-only': inRoot('lib', 'start', 'empty.ts') },
    tsconfig: inRoot('tsconfig.json'),
    sourcemap: true,
    logLevel: 'silent',
    write: false,
  }
}

/**
 * Puts each file in place by renaming, so that a process that starts meanwhile reads an old or a new one, never half of one.
 * @param {import('esbuild').OutputFile[]} files
 */
export function placeBundles(files) {
  fs.mkdirSync(inRoot('.jobs'), { recursive: true })
  for (const file of files) {
    const unfinished = `${file.path}.${process.pid}`
    fs.writeFileSync(unfinished, file.contents)
    fs.renameSync(unfinished, file.path)
  }
  const kept = new Set(files.map((file) => path.basename(file.path)))
  for (const name of fs.readdirSync(inRoot('.jobs'))) {
    if (!kept.has(name)) fs.rmSync(inRoot('.jobs', name), { recursive: true, force: true })
  }
}

/**
 * Bundles the programs for Node unless their sources are unchanged.
 * @param {(line: string) => void} say
 */
export async function ensureBundles(say) {
  const { present, missing } = sortEntries()
  for (const source of missing) say(`Left out, there is no ${source}`)
  const file = inRoot('.jobs', '.stamp')
  const paths = ['lib', 'prisma/schema', 'prisma/seed', 'prisma/seed.ts', 'tsconfig.json', 'package-lock.json']
  const stamp = stampOf({ paths, words: [...Object.keys(present), process.version] })
  if (readStamp(file) === stamp) return
  const { build } = await import('esbuild')
  try {
    const { outputFiles = [] } = await build(bundleOptions())
    placeBundles(outputFiles)
  } catch (error) {
    throw new Failure(
      `${error instanceof Error ? error.message : error}\nThe programs could not be bundled: correct the source above.`,
    )
  }
  writeStamp(file, stamp)
}
