// @ts-check

/**
 * What is to be ended when a command stops, the newest first: what was started last relies on what was started before.
 * @param {(line: string) => void} say
 */
export function undoList(say) {
  /** @type {(() => Promise<void>)[]} */
  const steps = []
  /** @type {Promise<void> | undefined} */
  let ending
  const run = async () => {
    for (const step of steps.reverse()) {
      try {
        await step()
      } catch (error) {
        // the other parts still have to be ended
        say(`While stopping: ${error instanceof Error ? error.message : error}`)
      }
    }
  }
  return {
    /** @param {() => Promise<void>} step */
    add: (step) => {
      steps.push(step)
    },
    /** Carries all steps out, once. @returns {Promise<void>} */
    end: () => {
      ending ??= run()
      return ending
    },
  }
}

/**
 * Runs `work` and everything it added to the list of what is to be ended, whether it succeeds, fails or is told to stop.
 * It ends the process.
 * @param {(line: string) => void} say
 * @param {(undo: ReturnType<typeof undoList>) => Promise<void>} work resolves when the command has nothing more to do
 */
export async function runUntilStopped(say, work) {
  const undo = undoList(say)
  for (const signal of /** @type {NodeJS.Signals[]} */ (['SIGINT', 'SIGTERM', 'SIGHUP'])) {
    process.on(signal, () => void undo.end().then(() => process.exit(0)))
  }
  try {
    await work(undo)
  } finally {
    await undo.end()
  }
}
