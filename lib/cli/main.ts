import path from 'node:path'
import { fileURLToPath } from 'node:url'
import { closeThreads } from '../compute/thread-pool'
import { DomainError } from '../errors'
import { printedVerdict } from '../exchange/printed-verdict'
import { studyFileSchemaText } from '../study/study-file-schema'
import { readArguments, usage } from './arguments'
import { type ComputedFile, computeFile } from './compute-file'
import { verdictLines } from './verdict-lines'

const print = (text: string) => process.stdout.write(text)
const complain = (text: string) => process.stderr.write(text)

/** The bundles of the thread programs lie beside this one. */
const programs = path.dirname(fileURLToPath(import.meta.url))

const verdictJson = ({ document, result: { engineVersion, overall } }: ComputedFile) => ({
  documentNumber: document.head.documentNumber,
  engineVersion,
  verdict: overall.word,
  counts: overall.counts,
  governing: overall.governing && { ...overall.governing, printed: printedVerdict(document, overall.governing) },
})

/** Runs the command and returns its exit status: 0 computed, 1 refused, 2 not understood. */
async function run(words: readonly string[]): Promise<number> {
  const command = readArguments(words)
  if (command.kind === 'usage') {
    complain(`${command.message}\n\n${usage}`)
    return 2
  }
  if (command.kind === 'help') print(usage)
  if (command.kind === 'schema') print(studyFileSchemaText())
  if (command.kind !== 'compute') return 0
  try {
    const computed = await computeFile({ ...command, programs, say: (line) => complain(`${line}\n`) })
    if (command.json) print(`${JSON.stringify(verdictJson(computed))}\n`)
    else print(`${verdictLines(computed.document, computed.result).join('\n')}\n`)
    return 0
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    complain(`${error.message}\n`)
    for (const { path: place, message } of error.issues)
      if (message !== error.message) complain(`${place.join('.') || 'the file'}: ${message}\n`)
    return 1
  } finally {
    await closeThreads()
  }
}

process.exitCode = await run(process.argv.slice(2))
