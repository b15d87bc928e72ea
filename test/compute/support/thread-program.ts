import path from 'node:path'
import { build } from 'esbuild'

const root = path.resolve(import.meta.dirname, '../../..')

/** Bundles a thread's program as the launcher does, into a folder of its own, and returns its path. */
export const threadProgram = async (source: string, name: string, banner = ''): Promise<string> => {
  const outfile = path.join(root, '.data/test/threads', `${name}.js`)
  await build({
    absWorkingDir: root,
    entryPoints: [source],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    tsconfig: path.join(root, 'tsconfig.json'),
    banner: { js: banner },
    logLevel: 'silent',
  })
  return outfile
}
