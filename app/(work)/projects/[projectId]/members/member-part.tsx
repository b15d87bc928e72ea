'use client'

import { useRouter } from 'next/navigation'
import { useState } from 'react'
import { answered, type Outcome } from '@/app/_action/outcome'
import { guestRoles, type ProjectRole, projectRoles } from '@/app/_words/role-words'
import type { Role } from '@/lib/policy/role'
import { Confirm } from '@/lib/ui/confirm'
import { Labelled } from '@/lib/ui/labelled'
import { change } from './actions'
import { RoleChoice } from './role-choice'

interface Member {
  userId: string
  name: string
  roles: readonly Role[]
  guest: boolean
  endsAt: string | null
}

/** What may be changed about one person's part in the project. */
export function MemberPart({ projectId, member }: { projectId: string; member: Member }) {
  const router = useRouter()
  const [roles, setRoles] = useState<ProjectRole[]>(projectRoles.filter((role) => member.roles.includes(role)))
  const [lastDay, setLastDay] = useState(member.endsAt?.slice(0, 10) ?? '')
  const settle = (outcome: Outcome<unknown>): string | null => {
    if (!outcome.ok) return outcome.issues[0]?.message ?? outcome.message
    router.refresh()
    return null
  }
  const save = async () =>
    roles.length === 0
      ? 'Choose at least one role, or remove the person from the project.'
      : settle(
          await answered(() => change(projectId, member.userId, { roles, lastDay: lastDay === '' ? null : lastDay })),
        )
  const remove = async () =>
    settle(await answered(() => change(projectId, member.userId, { roles: [], lastDay: null })))
  return (
    <div className="flex flex-wrap gap-2">
      <Confirm trigger="Change part" title={`Part of ${member.name}`} confirm="Change part" onConfirm={save}>
        <RoleChoice offered={member.guest ? guestRoles : projectRoles} chosen={roles} onChange={setRoles} />
        <Labelled label="Last day of access" aside="may stay empty">
          {(control) => (
            <input
              {...control}
              className="control"
              type="date"
              value={lastDay}
              onChange={(event) => setLastDay(event.target.value)}
            />
          )}
        </Labelled>
      </Confirm>
      <Confirm
        trigger="Remove person"
        tone="danger"
        title={`Remove ${member.name} from the project`}
        confirm="Remove person"
        onConfirm={remove}
      >
        <p className="m-0">
          Access ends at once. What the person wrote, decided and signed stays. Signing certificates are not touched by
          this.
        </p>
      </Confirm>
    </div>
  )
}
