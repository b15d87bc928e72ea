'use client'

import { type ProjectRole, roleWords } from '@/app/_words/role-words'

interface RoleChoiceProps {
  offered: readonly ProjectRole[]
  chosen: readonly ProjectRole[]
  error?: string | undefined
  onChange: (roles: ProjectRole[]) => void
}

/** Roles in the project; one person may have several. */
export function RoleChoice({ offered, chosen, error, onChange }: RoleChoiceProps) {
  return (
    <fieldset className="m-0 min-w-0 border-0 p-0">
      <legend className="mb-0.5 p-0 text-label font-semibold">Roles in the project</legend>
      {offered.map((role) => (
        <label key={role} className="flex items-center gap-2">
          <input
            type="checkbox"
            checked={chosen.includes(role)}
            onChange={(event) =>
              onChange(offered.filter((one) => (one === role ? event.target.checked : chosen.includes(one))))
            }
          />
          {roleWords[role]}
        </label>
      ))}
      {error ? <p className="m-0 mt-0.5 text-label text-fails">{error}</p> : null}
    </fieldset>
  )
}
