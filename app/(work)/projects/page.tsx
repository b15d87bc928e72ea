import type { Metadata } from 'next'
import { ask } from '@/app/_action/ask'
import { signedIn } from '@/app/_action/signed-in'
import { can } from '@/lib/policy/can'
import { myOrganisations, myProjects } from '@/lib/server/people/queries'
import { EmptyState } from '@/lib/ui/empty-state'
import { WorkFrame } from '../_frame/work-frame'
import { startProject } from './actions'
import { projectFields } from './new-fields'
import { ProjectSheet } from './project-sheet'
import { QuickForm } from './quick-form'

export const metadata: Metadata = { title: 'Projects' }

export default async function ProjectsPage() {
  const actor = await signedIn()
  const projects = await ask(myProjects, {})
  const organisations = await ask(myOrganisations, {})
  const mayStart = organisations.filter(({ organisationId, role }) => {
    const own = projects.filter((project) => project.organisationId === organisationId).flatMap(({ roles }) => roles)
    const roles = role === 'administrator' ? [...own, 'administrator' as const] : own
    return can({ userId: actor.userId, roles }, 'create-project').allowed
  })
  return (
    <WorkFrame path={[{ label: 'Projects' }]}>
      <div className="mx-auto flex max-w-5xl flex-col gap-4">
        <h1 className="m-0 text-title font-semibold">Projects</h1>
        {projects.length === 0 ? (
          <EmptyState title="You have no part in a project yet.">
            Ask the engineer or the administrator who invited you to add you to one.
          </EmptyState>
        ) : null}
        {projects.map((project) => (
          <ProjectSheet key={project.projectId} project={project} userId={actor.userId} />
        ))}
        {mayStart.map(({ organisationId, name }) => (
          <div key={organisationId}>
            <QuickForm
              verb={mayStart.length > 1 ? `Start project at ${name}` : 'Start project'}
              fields={projectFields}
              keptAs={`${actor.userId}/${organisationId}/new-project`}
              save={startProject.bind(null, organisationId)}
              goTo="/projects/:id/plant/bus"
            />
          </div>
        ))}
      </div>
    </WorkFrame>
  )
}
