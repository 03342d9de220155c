'use client'
import { Check } from '@/components/ui/Check'
import { ROLES, type Role } from '@/lib/auth/permissions'

/** What each role is for, in a line. */
const ROLE_HINTS: Record<Role, string> = {
  designer: 'opens jobs, uploads drawings, confirms their size',
  fabricator: 'reads sections, measures pieces',
  engineer: 'opens jobs, keeps materials, checks',
  viewer: 'reads everything, changes nothing',
}

export function RoleChecks({
  roles,
  administrator,
  disabled = false,
  onRoles,
  onAdministrator,
}: {
  roles: readonly Role[]
  administrator: boolean
  disabled?: boolean
  onRoles: (roles: Role[]) => void
  onAdministrator: (administrator: boolean) => void
}) {
  return (
    <>
      {ROLES.map((role) => (
        <Check
          key={role}
          label={role}
          hint={ROLE_HINTS[role]}
          disabled={disabled}
          checked={roles.includes(role)}
          onChange={(event) => onRoles(event.target.checked ? [...roles, role] : roles.filter((other) => other !== role))}
        />
      ))}
      <Check
        label="administrator"
        hint="a right beside the roles: invites, changes roles, sets units and symbols"
        disabled={disabled}
        checked={administrator}
        onChange={(event) => onAdministrator(event.target.checked)}
      />
    </>
  )
}
