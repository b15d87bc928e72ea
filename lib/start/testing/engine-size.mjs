// @ts-check
import { brotliCompressSync, gzipSync } from 'node:zlib'
import { inRoot, root } from '../root.mjs'

/**
 * Size of the whole calculation as a browser loads it: every file of the engine that something outside it uses, in one
 * file, without names and blanks.
 * @returns {Promise<{ bytes: number, gzip: number, brotli: number }>} brotli is what browsers take over HTTPS
 */
export async function engineSize() {
  const { build } = await import('esbuild')
  const doors = [
    'run-study.ts',
    'run-case.ts',
    'run-variants.ts',
    'estimate/estimate-circuit.ts',
    'estimate/same-plate.ts',
    'flicker/start-flicker.ts',
    'explore/breakeven-level.ts',
  ]
  const { outputFiles } = await build({
    absWorkingDir: root,
    stdin: {
      contents: doors.map((door) => `export * from './${door}'`).join('\n'),
      resolveDir: inRoot('lib', 'engine'),
    },
    bundle: true,
    minify: true,
    format: 'esm',
    target: 'es2022',
    tsconfig: inRoot('tsconfig.json'),
    write: false,
    logLevel: 'silent',
  })
  const contents = outputFiles[0]?.contents ?? new Uint8Array()
  return {
    bytes: contents.length,
    gzip: gzipSync(contents, { level: 9 }).length,
    brotli: brotliCompressSync(contents).length,
  }
}
