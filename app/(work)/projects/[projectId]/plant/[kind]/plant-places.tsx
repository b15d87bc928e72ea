import { PlaceList } from '@/app/(work)/_frame/place-list'
import { studyPlaces } from '@/app/(work)/_frame/places'
import { describeKind } from '@/app/(work)/_records/describe-kind'
import { plantKinds } from '@/lib/server/plants/schema'
import type { PlantRows } from '@/lib/server/row'

interface PlantPlacesProps {
  projectId: string
  studyId: string | null
  rows: PlantRows
}

/** The kinds of record with their numbers; around them the places of the study they are looked at for. */
export function PlantPlaces({ projectId, studyId, rows }: PlantPlacesProps) {
  const query = studyId ? `?study=${studyId}` : ''
  const kinds = plantKinds.map((kind) => {
    const within = `/projects/${projectId}/plant/${kind}`
    return { label: describeKind(kind).many, href: within + query, within, count: rows[kind].length }
  })
  const [records, ...others] = studyId ? studyPlaces(projectId, studyId) : []
  return (
    <>
      {records ? <PlaceList label="Places of the study" places={[records]} /> : null}
      <div className="md:my-1 md:pl-3 md:text-dense">
        <PlaceList label="Kinds of record" places={kinds} />
      </div>
      {others.length > 0 ? <PlaceList label="Further places of the study" places={others} /> : null}
    </>
  )
}
