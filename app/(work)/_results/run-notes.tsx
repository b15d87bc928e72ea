import type { StudyDocument } from '@/lib/study/document/study-document'
import type { CaseSummary } from '@/lib/study/summary'
import { modelSentence, modelWords } from '@/lib/study/words/model-words'
import { noticeSentence } from '@/lib/study/words/notice-words'
import { caseOutcomeSentence, runningOutcomeSentence, startOutcomeSentence } from '@/lib/study/words/outcome-words'
import { busTag, motorTag } from '@/lib/study/words/tags'

/** How the case went, in sentences: the run, each start, each running machine that did not simply ride through, and what was noticed. */
export function CaseSentences({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const sentences = [
    ...(result.outcome.kind === 'complete' ? [] : [caseOutcomeSentence(result.outcome, (id) => busTag(document, id))]),
    ...result.motors.flatMap(({ motorId, start, running }) => {
      const motor = motorTag(document, motorId)
      if (start) return [startOutcomeSentence(start.outcome, motor)]
      return running && running.outcome.kind !== 'rode-through' ? [runningOutcomeSentence(running.outcome, motor)] : []
    }),
  ]
  const notices = result.notices.map((notice) => noticeSentence(notice, document))
  return (
    <div className="max-w-4xl">
      {sentences.map((sentence) => (
        <p key={sentence} className="m-0">
          {sentence}
        </p>
      ))}
      {result.model === 'quasi-static' ? null : <p className="m-0 text-soft">{modelSentence(result)}</p>}
      {notices.length > 0 ? (
        <ul className="m-0 mt-1 list-disc pl-5 text-close">
          {notices.map((notice) => (
            <li key={notice}>{notice}</li>
          ))}
        </ul>
      ) : null}
    </div>
  )
}

/** What the calculation counted, so that its quality can be judged. */
export function RunCounters({ result, engineVersion }: { result: CaseSummary; engineVersion: string }) {
  const { steps, rejected, evaluations, networkIterations, largestMismatch, largestErrorRatio } = result.counters
  return (
    <p className="m-0 text-label text-soft">
      Run of engine {engineVersion}, {modelWords[result.model]} model: {steps} steps, {rejected} rejected, {evaluations}{' '}
      evaluations, {networkIterations} network iterations; largest current mismatch {largestMismatch.toExponential(1)}{' '}
      of the largest bus current, largest local error {largestErrorRatio.toFixed(2)} of the tolerance.
    </p>
  )
}
