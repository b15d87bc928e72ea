import type { Metadata } from 'next'
import { limitSentence } from '@/lib/study/words/limit-sentence'
import { studyOf } from '../../study'
import { StudyRecords } from '../study-records'

export const metadata: Metadata = { title: 'Limits sheet' }

export default async function LimitsPage({ params }: PageProps<'/studies/[studyId]/cases/limits'>) {
  const { studyId } = await params
  const study = await studyOf(studyId)
  const { document } = study
  const inWords = document
    ? Object.fromEntries(document.limits.map((record) => [record.id, `${limitSentence(record, document)}.`]))
    : undefined
  return <StudyRecords study={study} kind="limit" inWords={inWords} />
}
