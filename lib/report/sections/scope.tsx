import { paragraph, typedText } from '../paper/text-block'
import { chapter, subsection } from '../report-context'
import type { Section } from './section'

/** Purpose, scope and exclusions as the engineer typed them. */
export const scope: Section = (context) => {
  const { paper, input, words, width } = context
  const { texts } = input.document
  const { scope: say } = words.records
  const typed = (text: string, what: string) =>
    text.trim() === ''
      ? paragraph(paper, say.notTyped(what), { width, ink: 'soft' })
      : typedText(paper, text, { width })
  return [
    chapter(context, 'scope', say.title),
    subsection(context, 'scope-purpose', say.purpose),
    ...typed(texts.purpose, say.purpose.toLowerCase()),
    subsection(context, 'scope-scope', say.scope),
    ...typed(texts.scope, say.scope.toLowerCase()),
    subsection(context, 'scope-exclusions', say.exclusions),
    ...typed(texts.exclusions, say.exclusions.toLowerCase()),
  ]
}
