import type { ReactElement } from 'react'
import type { ReportContext } from '../report-context'

/** A part of the report: elements from top to bottom. */
export type Section = (context: ReportContext) => readonly ReactElement[]
