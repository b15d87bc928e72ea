import type { Metadata } from 'next'
import Link from 'next/link'
import { ask } from '@/app/_action/ask'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { projectTimeline, type TimelineLine } from '@/lib/server/timeline/queries'
import { Button } from '@/lib/ui/button'
import { DataTable } from '@/lib/ui/data-table'
import { Labelled } from '@/lib/ui/labelled'
import { Moment } from '@/lib/ui/moment'

export const metadata: Metadata = { title: 'Timeline' }

const one = (value: string | string[] | undefined): string | undefined =>
  typeof value === 'string' && value !== '' ? value : undefined

const words = (action: string): string => action.replaceAll('-', ' ')

const facts = (payload: unknown): string =>
  typeof payload === 'object' && payload !== null
    ? Object.entries(payload)
        .filter(([, value]) => ['string', 'number', 'boolean'].includes(typeof value) && value !== '')
        .filter(([key]) => !/(Id|Hash)$/.test(key))
        .map(([key, value]) => `${key}: ${String(value).slice(0, 80)}`)
        .join('; ')
    : ''

interface ChoiceProps {
  label: string
  name: string
  chosen: string | undefined
  options: readonly string[]
  print: (option: string) => string
}

function Choice({ label, name, chosen, options, print }: ChoiceProps) {
  return (
    <Labelled label={label}>
      {(control) => (
        <select {...control} name={name} className="control" defaultValue={chosen ?? ''}>
          <option value="">all</option>
          {options.map((option) => (
            <option key={option} value={option}>
              {print(option)}
            </option>
          ))}
        </select>
      )}
    </Labelled>
  )
}

export default async function TimelinePage({ params, searchParams }: PageProps<'/projects/[projectId]/timeline'>) {
  const { projectId } = await params
  const search = await searchParams
  const filters = { action: one(search.action), by: one(search.by) }
  const before = one(search.before)
  const timeline = await ask(projectTimeline, { projectId, ...filters, before: before ? Number(before) : undefined })
  const { project, lines, olderThan, actions, people, head } = timeline
  const older = new URLSearchParams(
    Object.entries({ ...filters, before: String(olderThan ?? '') }).flatMap(([key, value]) =>
      value ? [[key, value]] : [],
    ),
  )
  return (
    <WorkFrame
      path={[
        { label: 'Projects', href: '/projects' },
        { label: project, href: `/projects#${projectId}` },
        { label: 'Timeline' },
      ]}
    >
      <div className="flex flex-col gap-3">
        <h1 className="m-0 text-title font-semibold">Timeline of {project}</h1>
        <form method="get" className="flex flex-wrap items-end gap-3">
          <Choice label="What" name="action" chosen={filters.action} options={actions} print={words} />
          <Choice label="By" name="by" chosen={filters.by} options={people} print={(name) => name} />
          <Button type="submit">Show</Button>
          <a className="link" href={`/projects/${projectId}/timeline/file`}>
            Whole timeline as CSV
          </a>
        </form>
        <DataTable<TimelineLine>
          caption="What happened, newest first"
          rows={lines}
          rowId={({ sequence }) => String(sequence)}
          columns={[
            { id: 'sequence', label: 'No.', cell: ({ sequence }) => sequence },
            { id: 'at', label: 'At', cell: ({ at }) => <Moment at={at} /> },
            { id: 'by', label: 'By', cell: ({ by }) => by },
            { id: 'what', label: 'What', cell: ({ action }) => words(action) },
            {
              id: 'detail',
              label: 'Detail',
              cell: ({ payload }) => (
                <span className="inline-block max-w-2xl break-words">{facts(payload) || '–'}</span>
              ),
            },
          ]}
        />
        {lines.length === 0 ? <p className="m-0 text-soft">Nothing of this kind has happened.</p> : null}
        {olderThan === null ? null : (
          <p className="m-0">
            <Link prefetch={false} className="link" href={`/projects/${projectId}/timeline?${older}`}>
              Show older events
            </Link>
          </p>
        )}
        <p className="m-0 text-label break-all text-soft">
          Each event names the hash of the one before it. {head.sequence} events; hash of the last: {head.hash}
        </p>
      </div>
    </WorkFrame>
  )
}
