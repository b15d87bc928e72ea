import type { StudyDocument } from '@/lib/study/document/study-document'
import { cautionsFor } from '@/lib/study/words/cautions'

/** What these results are not, on every page that shows them. */
export function Cautions({ document }: { document: StudyDocument }) {
  return (
    <section aria-labelledby="cautions" className="max-w-4xl border-t border-rule pt-3 text-dense">
      <h2 id="cautions" className="m-0 mb-1 text-body font-semibold">
        Cautions
      </h2>
      <ul className="m-0 list-disc pl-5 text-soft">
        {cautionsFor(document).map(({ key, sentence, about }) => (
          <li key={key}>
            {about ? <span className="text-ink">{about}: </span> : null}
            {sentence}
          </li>
        ))}
      </ul>
    </section>
  )
}
