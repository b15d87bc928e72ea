import { inputGroups } from '@/lib/study/anchors/input-list'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { ScrollRegion } from '@/lib/ui/scroll-region'
import { Anchored } from './anchored'
import { TickBox } from './tick-box'

interface RevisionInputsProps {
  revisionId: string
  document: StudyDocument
  ticks: readonly { anchor: string; value: string; person: string; at: string }[]
  mayTick: boolean
}

const provenanceWords = {
  test: 'test report',
  guaranteed: 'guaranteed',
  typical: 'typical',
  derived: 'derived',
  assumed: 'assumed',
} as const

/** Every input of the revision as typed, with its source; the checker ticks each that was held against it. */
export function RevisionInputs({ revisionId, document, ticks, mayTick }: RevisionInputsProps) {
  const groups = inputGroups(document)
  const ticked = new Map(ticks.map((tick) => [tick.anchor, tick]))
  const all = groups.flatMap(({ inputs }) => inputs)
  const done = all.filter(({ anchor }) => ticked.has(anchor)).length
  return (
    <section aria-labelledby="inputs">
      <h2 id="inputs" className="m-0 mb-1 text-title font-semibold">
        Inputs and their sources
      </h2>
      <p className="m-0 mb-1 text-soft">
        {done} of {all.length} inputs ticked by the checker.
      </p>
      <div className="border border-hair bg-sheet">
        {groups.map(({ record, inputs }) => (
          <details key={record} className="border-b border-hair last:border-b-0">
            <summary className="px-3 py-1">
              <span className="font-semibold">{record}</span>{' '}
              <span className="text-soft">
                {inputs.filter(({ anchor }) => ticked.has(anchor)).length} of {inputs.length}
              </span>
            </summary>
            <ScrollRegion label={`Inputs of ${record}`}>
              <table className="dense">
                <caption className="sr-only">Inputs of {record}</caption>
                <thead>
                  <tr>
                    <th scope="col">Input</th>
                    <th scope="col" className="number">
                      Value
                    </th>
                    <th scope="col">Source</th>
                    <th scope="col">Checked</th>
                  </tr>
                </thead>
                <tbody>
                  {inputs.map(({ anchor, field, text, source }) => (
                    <tr key={anchor}>
                      <th scope="row" className="font-normal">
                        {field}
                      </th>
                      <td className="number">
                        <Anchored on={anchor}>{text}</Anchored>
                      </td>
                      <td>
                        {source ? (
                          <>
                            {provenanceWords[source.kind]}: {source.source}
                          </>
                        ) : (
                          <span className="text-close">no source stated</span>
                        )}
                      </td>
                      <td>
                        <TickBox
                          revisionId={revisionId}
                          anchor={anchor}
                          label={`${record}, ${field}: held against its source`}
                          ticked={ticked.get(anchor)?.person ?? null}
                          mayTick={mayTick}
                        />
                      </td>
                    </tr>
                  ))}
                </tbody>
              </table>
            </ScrollRegion>
          </details>
        ))}
      </div>
    </section>
  )
}
