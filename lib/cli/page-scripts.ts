import fs from 'node:fs'
import path from 'node:path'
import { gzipSync } from 'node:zlib'

/** Compressed script that a browser loads for one page, in bytes. */
export interface PageScripts {
  page: string
  bytes: number
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null

const texts = (value: unknown): string[] =>
  Array.isArray(value) ? value.filter((one): one is string => typeof one === 'string') : []

/** `globalThis.__RSC_MANIFEST["/route/page"] = {…}`: the route and what its entries load. */
const readManifest = (file: string): { page: string; chunks: string[] } | null => {
  const [, page, json] = /\["([^"]+)\/page"\] = (\{.*\});?\s*$/s.exec(fs.readFileSync(file, 'utf8')) ?? []
  if (page === undefined || json === undefined) return null
  const manifest: unknown = JSON.parse(json)
  const entries = isRecord(manifest) ? manifest.entryJSFiles : null
  return { page, chunks: isRecord(entries) ? Object.values(entries).flatMap(texts) : [] }
}

const manifestsIn = (folder: string): string[] =>
  fs
    .readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('page_client-reference-manifest.js'))
    .map((name) => path.join(folder, name))

/**
 * Script of every page of a built application (the folder `.next`), each chunk compressed by itself as a server sends
 * it. Empty where there is no build. Error pages that a page may show are counted with it: an upper bound.
 */
export const pageScripts = (build: string): PageScripts[] => {
  const shared = path.join(build, 'build-manifest.json')
  const app = path.join(build, 'server', 'app')
  if (!fs.existsSync(shared) || !fs.existsSync(app)) return []
  const manifest: unknown = JSON.parse(fs.readFileSync(shared, 'utf8'))
  const common = isRecord(manifest) ? texts(manifest.rootMainFiles) : []
  const sizes = new Map<string, number>()
  const sizeOf = (chunk: string): number => {
    const file = path.join(build, chunk)
    const size = sizes.get(chunk) ?? (fs.existsSync(file) ? gzipSync(fs.readFileSync(file)).length : 0)
    sizes.set(chunk, size)
    return size
  }
  return manifestsIn(app).flatMap((file) => {
    const found = readManifest(file)
    if (!found) return []
    const bytes = [...new Set([...common, ...found.chunks])].reduce((sum, chunk) => sum + sizeOf(chunk), 0)
    return [{ page: found.page, bytes }]
  })
}

/** Folder of the newest finished build under a project's root; null where nothing was built. */
export const newestBuild = (root: string): string | null => {
  const builds = path.join(root, '.build')
  const kept = fs.existsSync(builds) ? fs.readdirSync(builds).map((name) => path.join(builds, name, '.next')) : []
  const all = [...kept, path.join(root, '.next')].filter((one) => fs.existsSync(path.join(one, 'build-manifest.json')))
  const age = (one: string): number => fs.statSync(path.join(one, 'build-manifest.json')).mtimeMs
  return all.sort((a, b) => age(b) - age(a))[0] ?? null
}
