import { type ProvenanceKind, provenanceMark } from '@/lib/quantity/provenance'
import type { ValueProvenance } from '@/lib/study/document/entered'
import type { Cell } from '../paper/table-cell'
import type { FieldValue } from './record-field'

export interface Source {
  number: number
  kind: ProvenanceKind
  source: string
  count: number
}

/** Numbers each document, formula and reason the first time that a value names it. */
export class SourceList {
  readonly #sources = new Map<string, Source>()
  readonly #noSource: string

  constructor(noSourceMark: string) {
    this.#noSource = noSourceMark
  }

  get all(): readonly Source[] {
    return [...this.#sources.values()]
  }

  number({ kind, source }: ValueProvenance): number {
    const key = `${kind} ${source}`
    const found = this.#sources.get(key) ?? { number: this.#sources.size + 1, kind, source, count: 0 }
    this.#sources.set(key, { ...found, count: found.count + 1 })
    return found.number
  }

  /** A value as a table cell: mark of its provenance, text as typed, number of its source. */
  cell(value: FieldValue | null, silent: string): Cell {
    if (value === null) return { text: silent, ink: 'soft' }
    if (value.provenance === undefined) return { text: value.text }
    if (value.provenance === null) return { text: `${this.#noSource} ${value.text}` }
    const raised = String(this.number(value.provenance))
    return { text: `${provenanceMark[value.provenance.kind].mark} ${value.text}`, raised }
  }
}
