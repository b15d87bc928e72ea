import type { StudyView } from '@/lib/server/studies/view'
import { ComputePanel } from './compute-panel'

/** The computation of a study, with the button that starts it. */
export function StudyComputation({ study, resultsLink }: { study: StudyView; resultsLink?: boolean }) {
  const { run, problems } = study
  const { state, runId, done, of, failure } = run
  return (
    <ComputePanel
      studyId={study.studyId}
      given={{ state, runId, done, of, failure }}
      allowed={study.may.compute}
      problems={[...new Set(problems.map((problem) => problem.message))]}
      caseCount={study.rows.case.length}
      results={run.result === null ? 'none' : run.stale ? 'stale' : 'current'}
      resultsLink={resultsLink}
    />
  )
}
