import type { Metadata } from 'next'
import { ask } from '@/app/_action/ask'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { type InvitationLine, type MemberLine, projectMembers } from '@/lib/server/people/member-queries'
import { type Column, DataTable } from '@/lib/ui/data-table'
import { Moment } from '@/lib/ui/moment'
import { InviteForm } from './invite-form'
import { MemberPart } from './member-part'
import { WithdrawButton } from './withdraw-button'

export const metadata: Metadata = { title: 'Members' }

const memberColumns: readonly Column<MemberLine>[] = [
  { id: 'name', label: 'Person', cell: ({ name }) => name },
  { id: 'email', label: 'E-mail address', cell: ({ email }) => email },
  { id: 'roles', label: 'Roles', cell: ({ roles }) => roles.join(', ') },
  { id: 'belongs', label: 'Belongs to', cell: ({ guest }) => (guest ? 'guest' : 'the organisation') },
  {
    id: 'ends',
    label: 'Access until',
    cell: ({ endsAt, ended }) =>
      endsAt === null ? (
        'no end'
      ) : (
        <>
          {ended ? 'ended ' : ''}
          <Moment at={endsAt} />
        </>
      ),
  },
]

const invitationColumns = (projectId: string): readonly Column<InvitationLine>[] => [
  { id: 'name', label: 'Person', cell: ({ name }) => name },
  { id: 'email', label: 'E-mail address', cell: ({ email }) => email },
  { id: 'roles', label: 'Roles', cell: ({ roles, guest }) => `${roles.join(', ')}${guest ? ' (guest)' : ''}` },
  { id: 'by', label: 'Invited by', cell: ({ invitedBy }) => invitedBy },
  { id: 'until', label: 'Link works until', cell: ({ expiresAt }) => <Moment at={expiresAt} /> },
  {
    id: 'act',
    label: 'Action',
    cell: ({ invitationId, name }) => <WithdrawButton projectId={projectId} invitationId={invitationId} name={name} />,
  },
]

export default async function MembersPage({ params }: PageProps<'/projects/[projectId]/members'>) {
  const { projectId } = await params
  const { project, members, invitations, manages } = await ask(projectMembers, { projectId })
  const action: Column<MemberLine> = {
    id: 'act',
    label: 'Action',
    cell: (member) => <MemberPart projectId={projectId} member={member} />,
  }
  return (
    <WorkFrame
      path={[
        { label: 'Projects', href: '/projects' },
        { label: project.name, href: `/projects#${projectId}` },
        { label: 'Members' },
      ]}
    >
      <div className="mx-auto flex max-w-5xl flex-col gap-5">
        <div>
          <h1 className="m-0 text-title font-semibold">Members of {project.name}</h1>
          <p className="m-0 text-soft">
            {project.organisation}.{' '}
            {manages ? '' : 'An administrator of the organisation invites people and changes roles.'}
          </p>
        </div>
        <DataTable<MemberLine>
          caption={`Members of ${project.name}`}
          rows={members}
          rowId={({ userId }) => userId}
          columns={manages ? [...memberColumns, action] : memberColumns}
        />
        {invitations.length > 0 ? (
          <DataTable<InvitationLine>
            caption="Open invitations"
            captionHidden={false}
            rows={invitations}
            rowId={({ invitationId }) => invitationId}
            columns={invitationColumns(projectId)}
          />
        ) : null}
        {manages ? <InviteForm projectId={projectId} /> : null}
      </div>
    </WorkFrame>
  )
}
