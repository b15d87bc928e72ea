import Link from 'next/link'
import { stateWords } from '@/app/_words/state-words'
import { can } from '@/lib/policy/can'
import type { ProjectLine, StudyLine } from '@/lib/server/people/queries'
import { DataTable } from '@/lib/ui/data-table'
import { startStudy } from './actions'
import { studyStartFields } from './new-fields'
import { QuickForm } from './quick-form'

/** One project: who it is for, its records, and its studies with where each stands. */
export function ProjectSheet({ project, userId }: { project: ProjectLine; userId: string }) {
  const { projectId, name, client, organisation, roles, studies } = project
  const actor = { userId, roles }
  const team = can(actor, 'read-study').allowed
  const reviews = roles.includes('commenter')
  const href = ({ studyId, revision }: StudyLine): string => {
    if (team || !revision) return `/studies/${studyId}/cases`
    return reviews ? `/studies/${studyId}/revisions/${revision.revisionId}` : `/reports/${revision.revisionId}`
  }
  return (
    <section id={projectId} aria-labelledby={`name-${projectId}`} className="border border-hair bg-sheet p-4">
      <div className="mb-2 flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1">
        <h2 id={`name-${projectId}`} className="m-0 text-body font-semibold">
          {name}
        </h2>
        <span className="flex gap-4">
          {team ? (
            <>
              <Link prefetch={false} href={`/projects/${projectId}/members`} className="link">
                Members
              </Link>
              <Link prefetch={false} href={`/projects/${projectId}/timeline`} className="link">
                Timeline
              </Link>
            </>
          ) : null}
          {can(actor, 'read-plant').allowed ? (
            <Link prefetch={false} href={`/projects/${projectId}/plant/bus`} className="link">
              Open plant records
            </Link>
          ) : null}
        </span>
      </div>
      <p className="m-0 mb-2 text-dense text-soft">
        {client ? `For ${client}. ` : ''}
        {organisation}. Your part: {roles.join(', ')}.
      </p>
      {studies.length === 0 ? (
        <p className="m-0 mb-2 text-soft">{team ? 'No study yet.' : 'No report has been issued yet.'}</p>
      ) : (
        <DataTable<StudyLine>
          caption={`Studies of ${name}`}
          rows={studies}
          rowId={(study) => study.studyId}
          columns={[
            { id: 'number', label: 'Document', cell: (study) => study.documentNumber },
            {
              id: 'title',
              label: 'Title',
              cell: (study) => (
                <Link prefetch={false} href={href(study)} className="link">
                  {study.title}
                </Link>
              ),
            },
            { id: 'revision', label: 'Revision', cell: (study) => study.revision?.number ?? '–' },
            { id: 'state', label: 'State', cell: (study) => (study.state ? stateWords[study.state] : 'in work') },
          ]}
        />
      )}
      {can(actor, 'edit-study').allowed ? (
        <div className="mt-3">
          <QuickForm
            verb="Start study"
            fields={studyStartFields}
            keptAs={`${userId}/${projectId}/new-study`}
            save={startStudy.bind(null, projectId)}
            goTo="/studies/:id/cases"
          />
        </div>
      ) : null}
    </section>
  )
}
