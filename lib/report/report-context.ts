import type { ReactElement } from 'react'
import type { StudyVerdict } from '@/lib/engine/study-run'
import { heading } from './paper/heading'
import type { Paper } from './paper/paper'
import type { ReportInput } from './report-input'
import type { PageFormats } from './theme'
import type { SourceList } from './values/source-list'
import type { Wording } from './wording/en'

/** What every section is written from. */
export interface ReportContext {
  paper: Paper
  input: ReportInput
  words: Wording
  formats: PageFormats
  /** Width of the text in points. */
  width: number
  /** Verdict over the design cases. */
  whole: StudyVerdict
  sources: SourceList
  numbers: Numbering
}

/** Counts chapters, appendices, sub-headings and figures in the order in which they are written. */
export class Numbering {
  #chapter = 0
  #appendix = 0
  #sub = 0
  #figure = 0
  #prefix = ''

  chapter(): string {
    this.#chapter += 1
    this.#sub = 0
    this.#prefix = String(this.#chapter)
    return this.#prefix
  }

  appendix(): string {
    this.#appendix += 1
    this.#sub = 0
    this.#prefix = String.fromCharCode(64 + this.#appendix)
    return this.#prefix
  }

  sub(): string {
    this.#sub += 1
    return `${this.#prefix}.${this.#sub}`
  }

  figure(): number {
    this.#figure += 1
    return this.#figure
  }
}

export const chapter = ({ paper, width, numbers }: ReportContext, id: string, title: string): ReactElement =>
  heading(paper, width, { id, level: 1, number: numbers.chapter(), title })

export const appendix = ({ paper, width, numbers }: ReportContext, id: string, title: string): ReactElement =>
  heading(paper, width, { id, level: 1, number: numbers.appendix(), title })

export const subsection = ({ paper, width, numbers }: ReportContext, id: string, title: string): ReactElement =>
  heading(paper, width, { id, level: 2, number: numbers.sub(), title })
