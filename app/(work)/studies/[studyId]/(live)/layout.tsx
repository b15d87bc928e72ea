import { PlaceList } from '@/app/(work)/_frame/place-list'
import { studyPlaces } from '@/app/(work)/_frame/places'
import { studyTitleCells } from '@/app/(work)/_frame/study-title-cells'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { studyOf } from './study'

export default async function StudyLayout({ params, children }: LayoutProps<'/studies/[studyId]'>) {
  const { studyId } = await params
  const study = await studyOf(studyId)
  const { projectId, project, head } = study
  return (
    <WorkFrame
      path={[
        { label: 'Projects', href: '/projects' },
        { label: project.name, href: `/projects#${projectId}` },
        { label: head.title },
      ]}
      places={<PlaceList label="Places of the study" places={studyPlaces(projectId, studyId)} />}
      cells={studyTitleCells(study)}
      live={{ projectId, after: study.sequence, where: `study/${studyId}` }}
    >
      {children}
    </WorkFrame>
  )
}
