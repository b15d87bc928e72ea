import fs from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { gzipSync } from 'node:zlib'
import { afterAll, expect, test } from 'vitest'
import { newestBuild, pageScripts } from '@/lib/cli/page-scripts'

const root = fs.mkdtempSync(path.join(os.tmpdir(), 'breakaway-pages-'))
afterAll(() => fs.rmSync(root, { recursive: true }))

const put = (name: string, text: string): void => {
  const file = path.join(root, name)
  fs.mkdirSync(path.dirname(file), { recursive: true })
  fs.writeFileSync(file, text)
}
const size = (text: string): number => gzipSync(text).length

const manifest = (page: string, entries: Record<string, readonly string[]>): string =>
  `globalThis.__RSC_MANIFEST = globalThis.__RSC_MANIFEST || {};\n` +
  `globalThis.__RSC_MANIFEST["${page}/page"] = ${JSON.stringify({ clientModules: {}, entryJSFiles: entries })};\n`

test('a project that was never built has no build and no pages', () => {
  expect(newestBuild(root)).toBeNull()
  expect(pageScripts(path.join(root, '.next'))).toEqual([])
})

test('a page loads the shared chunks and its own, each once and compressed by itself', () => {
  put('.next/build-manifest.json', JSON.stringify({ rootMainFiles: ['static/a.js'] }))
  put('.next/static/a.js', 'a'.repeat(5000))
  put('.next/static/b.js', 'b, and what it brings along')
  put('.next/static/c.js', 'c')
  put(
    '.next/server/app/(account)/sign-in/page_client-reference-manifest.js',
    manifest('/(account)/sign-in', { layout: ['static/b.js'], page: ['static/b.js', 'static/c.js', 'static/a.js'] }),
  )
  const build = newestBuild(root)!
  expect(pageScripts(build)).toEqual([
    {
      page: '/(account)/sign-in',
      bytes: size('a'.repeat(5000)) + size('b, and what it brings along') + size('c'),
    },
  ])
})

test('the newest of several builds is measured', () => {
  put('.build/one/.next/build-manifest.json', '{}')
  put('.build/two/.next/build-manifest.json', '{}')
  const future = new Date(Date.now() + 60_000)
  fs.utimesSync(path.join(root, '.build/two/.next/build-manifest.json'), future, future)
  expect(newestBuild(root)).toBe(path.join(root, '.build/two/.next'))
})
