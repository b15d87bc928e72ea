import { parseArgs } from 'node:util'

/** What the command was asked to do. */
export type Command =
  | { kind: 'help' }
  | { kind: 'schema' }
  | { kind: 'compute'; file: string; out: string; report: boolean; json: boolean; date: string | null }
  | { kind: 'usage'; message: string }

export const usage = `Computes a study file and writes its results, plots and report into a folder.

  npm run study -- FILE --out FOLDER [--no-report] [--json] [--date YYYY-MM-DD]
  npm run study -- --schema        prints the JSON Schema of a study file
  npm run study -- --help

  --out FOLDER    where results.json, the tables (CSV), the plots (SVG) and report.pdf go; made if missing
  --no-report     leaves the PDF out
  --json          prints the verdict as one JSON object instead of sentences
  --date          date printed in the report; otherwise the date on which the file was last changed

Exit status: 0 computed (whatever the verdict), 1 the study was refused, 2 the command was not understood.
`

const day = /^\d{4}-\d{2}-\d{2}$/

/** Reads the words after the command's name; what cannot be read is a usage with one sentence. */
export function readArguments(words: readonly string[]): Command {
  try {
    const { values, positionals } = parseArgs({
      args: [...words],
      allowPositionals: true,
      allowNegative: true,
      options: {
        out: { type: 'string', short: 'o' },
        report: { type: 'boolean', default: true },
        json: { type: 'boolean', default: false },
        date: { type: 'string' },
        schema: { type: 'boolean', default: false },
        help: { type: 'boolean', short: 'h', default: false },
      },
    })
    if (values.help) return { kind: 'help' }
    if (values.schema) return { kind: 'schema' }
    const [file, ...more] = positionals
    if (file === undefined) return { kind: 'usage', message: 'Name the study file to compute.' }
    if (more.length > 0) return { kind: 'usage', message: `Name one study file; “${more[0]}” is a second one.` }
    if (values.out === undefined) return { kind: 'usage', message: 'Name the folder for the results with --out.' }
    const { out, report, json, date } = values
    if (date !== undefined && !(day.test(date) && !Number.isNaN(Date.parse(date))))
      return { kind: 'usage', message: 'Give --date as year-month-day, for example 2026-05-12.' }
    return { kind: 'compute', file, out, report, json, date: date ?? null }
  } catch (error) {
    return { kind: 'usage', message: error instanceof Error ? `${error.message.split('. ')[0]}.` : String(error) }
  }
}
