import type { Metadata } from 'next'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { StudyComputation } from '../_computing/study-computation'
import { studyOf } from '../study'
import { StudyRecords } from './study-records'

export const metadata: Metadata = { title: 'Cases' }

export default async function CasesPage({ params }: PageProps<'/studies/[studyId]/cases'>) {
  const { studyId } = await params
  const study = await studyOf(studyId)
  const { document } = study
  const inWords = document
    ? Object.fromEntries(document.cases.map((record) => [record.id, `${caseSentence(record, document)}.`]))
    : undefined
  return (
    <>
      <StudyComputation study={study} resultsLink />
      <StudyRecords study={study} kind="case" inWords={inWords} />
    </>
  )
}
