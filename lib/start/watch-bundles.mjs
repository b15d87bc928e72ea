// @ts-check
import { bundleOptions, placeBundles } from './bundle.mjs'

/**
 * Bundles the programs for Node again whenever a source changes, for development.
 * @param {(line: string) => void} say
 * @param {() => Promise<void>} onChange
 * @returns {Promise<() => Promise<void>>} ends the watch
 */
export async function watchBundles(say, onChange) {
  const { context } = await import('esbuild')
  let first = true
  const watching = await context({
    ...bundleOptions(),
    plugins: [
      {
        name: 'place',
        setup: ({ onEnd }) => {
          onEnd(async ({ errors, outputFiles = [] }) => {
            for (const { text, location } of errors) say(`${location?.file ?? ''}:${location?.line ?? ''} ${text}`)
            if (errors.length > 0) return
            placeBundles(outputFiles)
            // the processes were just started with what the first round finds
            if (!first) await onChange()
            first = false
          })
        },
      },
    ],
  })
  await watching.watch()
  return () => watching.dispose()
}
