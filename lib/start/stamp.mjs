// @ts-check
import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { root } from './root.mjs'

/**
 * Files below a path, sorted; the path itself when it is a file, nothing when it is not there.
 * @param {string} start
 * @param {(relative: string) => boolean} wanted
 * @returns {string[]}
 */
function filesBelow(start, wanted) {
  const stat = fs.statSync(start, { throwIfNoEntry: false })
  if (!stat) return []
  if (!stat.isDirectory()) return [start]
  return fs
    .readdirSync(start, { withFileTypes: true })
    .map((entry) => path.join(start, entry.name))
    .filter((file) => wanted(path.relative(root, file)))
    .sort()
    .flatMap((file) => filesBelow(file, wanted))
}

/**
 * A number that changes when any of the files or words does; a step whose stamp is unchanged need not be redone.
 * @param {{ paths: string[], words?: string[], except?: string[] }} of paths relative to `base`, which is the project unless told otherwise
 * @param {string} [base]
 * @returns {string}
 */
export function stampOf({ paths, words = [], except = [] }, base = root) {
  const hash = crypto.createHash('sha256')
  for (const word of words) hash.update(`${word}\0`)
  const left = new Set(except.map((name) => path.join(base, name)))
  for (const name of paths) {
    for (const file of filesBelow(path.join(base, name), (relative) => !left.has(path.join(root, relative)))) {
      hash
        .update(`${path.relative(base, file)}\0`)
        .update(fs.readFileSync(file))
        .update('\0')
    }
  }
  return hash.digest('hex').slice(0, 24)
}

/** @param {string} file @returns {string | null} the stamp written there */
export function readStamp(file) {
  try {
    return fs.readFileSync(file, 'utf8').trim()
  } catch {
    return null
  }
}

/** @param {string} file @param {string} stamp */
export const writeStamp = (file, stamp) => fs.writeFileSync(file, `${stamp}\n`)
