// @ts-check
import path from 'node:path'

/** The project's folder; every path of the launcher is made absolute with it, so that it may be called from anywhere. */
export const root = path.resolve(import.meta.dirname, '../..')

/** @param {string[]} parts @returns {string} absolute path inside the project */
export const inRoot = (...parts) => path.join(root, ...parts)
