import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { Suspense } from 'react'
import { ask } from '@/app/_action/ask'
import { signedIn } from '@/app/_action/signed-in'
import { studyTitleCells } from '@/app/(work)/_frame/study-title-cells'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { recordOptions, recordTags } from '@/app/(work)/_records/record-options'
import { RecordWorkspace } from '@/app/(work)/_records/record-workspace'
import { myProjects } from '@/lib/server/people/queries'
import { plantRecords } from '@/lib/server/plants/queries'
import { plantKind } from '@/lib/server/plants/schema'
import { studyView } from '@/lib/server/studies/queries'
import { removePlantRecord, savePlantRecord } from './actions'
import { PlantPlaces } from './plant-places'

export const metadata: Metadata = { title: 'Plant records' }

type Search = { study?: string | string[] }

/** The study whose frame stands around the plant: the one named, or the project's only one. */
const studyAround = async (projectId: string, { study }: Search): Promise<string | null> => {
  const project = (await ask(myProjects, {})).find((one) => one.projectId === projectId)
  const ids = project?.studies.map((one) => one.studyId) ?? []
  if (typeof study === 'string' && ids.includes(study)) return study
  return ids.length === 1 ? (ids[0] ?? null) : null
}

export default async function PlantPage({ params, searchParams }: PageProps<'/projects/[projectId]/plant/[kind]'>) {
  const { projectId, kind: asked } = await params
  const kind = plantKind.safeParse(asked)
  if (!kind.success) notFound()
  const actor = await signedIn()
  const { project, rows, editable } = await ask(plantRecords, { projectId })
  const studyId = await studyAround(projectId, await searchParams)
  const study = studyId ? await ask(studyView, { studyId }) : null
  const place = { projectId, kind: kind.data }
  const path = [
    { label: 'Projects', href: '/projects' },
    { label: project.name, href: `/projects#${projectId}` },
    ...(study ? [{ label: study.head.title, href: `/studies/${study.studyId}/cases` }] : []),
    { label: 'Records' },
  ]
  return (
    <WorkFrame
      path={path}
      places={<PlantPlaces projectId={projectId} studyId={studyId} rows={rows} />}
      cells={study ? studyTitleCells(study) : undefined}
      live={study ? { projectId, after: study.sequence, where: `study/${study.studyId}` } : undefined}
    >
      <Suspense>
        <RecordWorkspace
          key={kind.data}
          kind={kind.data}
          rows={rows[kind.data]}
          options={recordOptions(rows)}
          tags={recordTags(rows)}
          style={study?.numberStyle ?? 'point'}
          editable={editable}
          scope={`${actor.userId}/${projectId}`}
          actions={{ save: savePlantRecord.bind(null, place), remove: removePlantRecord.bind(null, place) }}
        />
      </Suspense>
    </WorkFrame>
  )
}
