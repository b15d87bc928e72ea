import { cautions } from './en/cautions'
import { fields } from './en/fields'
import { frame } from './en/frame'
import { handCheck } from './en/hand-check'
import { method } from './en/method'
import { protection } from './en/protection'
import { records } from './en/records'
import { results } from './en/results'
import { sheets } from './en/sheets'
import { verdict } from './en/verdict'

/** All wording of a report in English; another language is another object of this shape. */
export const english = {
  language: 'en',
  cautions,
  fields,
  frame,
  handCheck,
  method,
  protection,
  records,
  results,
  sheets,
  verdict,
}

export type Wording = typeof english
