import type { ReactElement } from 'react'
import { typedText } from '../paper/text-block'
import type { ReportContext } from '../report-context'
import { filledText } from '../values/placeholders'

/** What the author added to a chapter, with names in braces filled. */
export const addedTexts = ({ paper, input, width }: ReportContext, part: string | null): readonly ReactElement[] =>
  input.document.texts.added
    .filter((added) => added.part === part && added.text.trim() !== '')
    .flatMap(({ text }) => typedText(paper, filledText(text, input).text, { width, above: 4 }))
