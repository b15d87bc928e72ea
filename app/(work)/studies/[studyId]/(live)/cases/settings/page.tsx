import type { Metadata } from 'next'
import { signedIn } from '@/app/_action/signed-in'
import { studyOf } from '../../study'
import { StudySheet } from './study-sheet'

export const metadata: Metadata = { title: 'Settings and texts' }

export default async function SettingsPage({ params }: PageProps<'/studies/[studyId]/cases/settings'>) {
  const { studyId } = await params
  const actor = await signedIn()
  const { head, settings, texts, frequency, numberStyle, version, may } = await studyOf(studyId)
  return (
    <StudySheet
      studyId={studyId}
      version={version}
      values={{ head, settings, texts, frequency, numberStyle }}
      style={numberStyle}
      editable={may.edit}
      keptAs={`${actor.userId}/${studyId}/settings`}
    />
  )
}
