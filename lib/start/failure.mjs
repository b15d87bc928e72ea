// @ts-check

/** A failure the person at the terminal can do something about: one sentence that names the remedy. */
export class Failure extends Error {
  /** @param {string} sentence @param {unknown} [cause] */
  constructor(sentence, cause) {
    super(sentence, { cause })
    this.name = 'Failure'
  }
}

/** @type {Record<string, string>} what the usual errors of the operating system mean for somebody who starts the program */
const remedies = {
  EACCES: 'is not readable or writable for this account: give the account that starts Breakaway rights on it',
  EPERM: 'is not permitted for this account: give the account that starts Breakaway rights on it',
  EROFS: 'is on a read-only file system: set DATA_DIR to a folder that can be written',
  ENOSPC: 'could not be written because the disk is full: free some space',
}

/**
 * One sentence for any error; a bug keeps its stack, since nobody can act on less.
 * @param {unknown} error
 * @returns {string}
 */
export function explain(error) {
  if (error instanceof Failure) return error.message
  if (error instanceof Error) {
    const { code, path } = /** @type {NodeJS.ErrnoException} */ (error)
    const remedy = code === undefined ? undefined : remedies[code]
    return remedy ? `${path ?? 'A file'} ${remedy}.` : (error.stack ?? error.message)
  }
  return String(error)
}

/**
 * Runs a command of the project; a failure is printed and becomes the exit status 1.
 * @param {() => Promise<void>} command
 */
export async function runCommand(command) {
  try {
    await command()
  } catch (error) {
    process.stderr.write(`${explain(error)}\n`)
    process.exit(1)
  }
}
