import { paragraph, typedText } from '../paper/text-block'
import { chapter } from '../report-context'
import type { Section } from './section'

/** Conclusions as the engineer typed them. */
export const conclusions: Section = (context) => {
  const { paper, input, words, width } = context
  const { conclusions: text } = input.document.texts
  return [
    chapter(context, 'conclusions', words.verdict.conclusions),
    ...(text.trim() === ''
      ? paragraph(paper, words.verdict.noConclusions, { width, ink: 'soft' })
      : typedText(paper, text, { width })),
  ]
}
