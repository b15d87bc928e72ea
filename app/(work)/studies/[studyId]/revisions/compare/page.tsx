import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { ask } from '@/app/_action/ask'
import { signedIn } from '@/app/_action/signed-in'
import { PlaceList } from '@/app/(work)/_frame/place-list'
import { studyPlaces } from '@/app/(work)/_frame/places'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { can } from '@/lib/policy/can'
import { type ComparedRevision, compareRevisions } from '@/lib/server/compare/queries'
import { revisionsOf, revisionView } from '@/lib/server/revisions/queries'
import { Button } from '@/lib/ui/button'
import { DataTable } from '@/lib/ui/data-table'
import { Labelled } from '@/lib/ui/labelled'

export const metadata: Metadata = { title: 'Compare revisions' }

const called = ({ number, attempt }: Pick<ComparedRevision, 'number' | 'attempt'>): string =>
  `Revision ${number}${attempt > 1 ? `, attempt ${attempt}` : ''}`

const none = (text: string | null) => text ?? <span className="text-soft">none</span>

export default async function ComparePage({ params, searchParams }: PageProps<'/studies/[studyId]/revisions/compare'>) {
  const { studyId } = await params
  const { from: asked, to: wanted } = await searchParams
  const { userId } = await signedIn()
  const revisions = await ask(revisionsOf, { studyId })
  const to = typeof wanted === 'string' ? wanted : revisions[0]?.revisionId
  const from = typeof asked === 'string' ? asked : revisions.find(({ revisionId }) => revisionId !== to)?.revisionId
  if (!from || !to) notFound()
  const view = await ask(revisionView, { revisionId: to })
  const { sentence, verdicts, results, inputs, ...sides } = await ask(compareRevisions, { from, to })
  const team = can({ userId, roles: view.roles }, 'read-study').allowed
  const heads = { before: called(sides.from), after: called(sides.to) }
  const choice = (label: string, name: string, chosen: string) => (
    <Labelled label={label}>
      {(control) => (
        <select {...control} name={name} className="control" defaultValue={chosen}>
          {revisions.map((revision) => (
            <option key={revision.revisionId} value={revision.revisionId}>
              {called(revision)}
            </option>
          ))}
        </select>
      )}
    </Labelled>
  )
  return (
    <WorkFrame
      path={[
        { label: 'Projects', href: '/projects' },
        team ? { label: view.title, href: `/studies/${studyId}/review` } : { label: view.title },
        { label: 'Compare revisions' },
      ]}
      places={
        team ? <PlaceList label="Places of the study" places={studyPlaces(view.projectId, studyId)} /> : undefined
      }
    >
      <div className="flex flex-col gap-4">
        <h1 className="m-0 text-title font-semibold">
          {heads.before} against {heads.after}
        </h1>
        <form method="get" className="flex flex-wrap items-end gap-3">
          {choice('From', 'from', from)}
          {choice('To', 'to', to)}
          <Button type="submit">Compare</Button>
        </form>
        <p className="m-0 max-w-4xl border-l-4 border-rule bg-sheet px-3 py-2">{sentence}</p>
        <section aria-labelledby="verdicts" className="flex flex-col gap-1">
          <h2 id="verdicts" className="m-0 text-title font-semibold">
            Verdicts
          </h2>
          {verdicts.length === 0 ? (
            <p className="m-0 text-soft">Every verdict reads the same.</p>
          ) : (
            <DataTable
              caption="Verdicts that do not read the same"
              rows={verdicts}
              rowId={({ limitId, caseId }) => `${limitId}/${caseId}`}
              columns={[
                { id: 'limit', label: 'Limit', cell: (row) => `${row.limit} in ${row.case}` },
                { id: 'before', label: heads.before, cell: ({ before }) => none(before) },
                { id: 'after', label: heads.after, cell: ({ after }) => none(after) },
                {
                  id: 'flipped',
                  label: 'Change',
                  cell: ({ flipped }) => (flipped ? <strong className="text-fails">another verdict</strong> : 'figure'),
                },
              ]}
            />
          )}
        </section>
        <section aria-labelledby="figures" className="flex flex-col gap-1">
          <h2 id="figures" className="m-0 text-title font-semibold">
            Figures
          </h2>
          {results.length === 0 ? (
            <p className="m-0 text-soft">No figure of a case that both have is another one, at the digits compared.</p>
          ) : (
            <DataTable
              caption="Figures that are not the same"
              rows={results}
              rowId={(row) => `${row.caseId} ${row.what}`}
              columns={[
                { id: 'case', label: 'Case', cell: (row) => row.case },
                { id: 'what', label: 'Figure', cell: ({ what }) => what },
                { id: 'before', label: heads.before, numeric: true, cell: ({ before }) => none(before) },
                { id: 'after', label: heads.after, numeric: true, cell: ({ after }) => none(after) },
              ]}
            />
          )}
        </section>
        <section aria-labelledby="inputs" className="flex flex-col gap-1">
          <h2 id="inputs" className="m-0 text-title font-semibold">
            Inputs, limits and texts
          </h2>
          {inputs.length === 0 ? (
            <p className="m-0 text-soft">Nothing that was entered is another one.</p>
          ) : (
            <DataTable
              caption="What was entered otherwise"
              rows={inputs}
              rowId={({ anchor }) => anchor}
              columns={[
                { id: 'record', label: 'Record', cell: ({ record }) => record },
                { id: 'field', label: 'Field', cell: ({ field }) => field },
                { id: 'before', label: heads.before, cell: ({ before }) => none(before) },
                { id: 'after', label: heads.after, cell: ({ after }) => none(after) },
              ]}
            />
          )}
        </section>
      </div>
    </WorkFrame>
  )
}
