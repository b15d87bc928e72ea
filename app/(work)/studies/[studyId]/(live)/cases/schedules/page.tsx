import type { Metadata } from 'next'
import { studyOf } from '../../study'
import { StudyRecords } from '../study-records'

export const metadata: Metadata = { title: 'Start schedules' }

export default async function SchedulesPage({ params }: PageProps<'/studies/[studyId]/cases/schedules'>) {
  const { studyId } = await params
  return <StudyRecords study={await studyOf(studyId)} kind="schedule" />
}
