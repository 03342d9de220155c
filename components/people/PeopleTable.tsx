'use client'
import { lazy, useState } from 'react'
import { ExportMenu } from '@/components/lists/ExportMenu'
import { useLocalSort } from '@/components/lists/useLocalSort'
import { useMay, useMe } from '@/components/shell/Me'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { formatDate } from '@/components/ui/dates'
import { problemOf } from '@/components/ui/problem'
import { type Column, Table } from '@/components/ui/Table'
import { toast } from '@/components/ui/toastStore'
import type { Invitation, Person } from '@/lib/api/schemas/people'
import { useInvitations, usePeople, withdraw } from './data'

const PersonForm = lazy(() => import('./PersonForm').then((module) => ({ default: module.PersonForm })))

const InviteForm = lazy(() => import('./InviteForm').then((module) => ({ default: module.InviteForm })))

const rolesOf = ({ roles, administrator, disabled }: Person) =>
  disabled ? 'disabled' : [...roles, ...(administrator ? ['administrator'] : [])].join(', ')

/** Who is in the team, with roles; an administrator invites, changes and disables. */
export function PeopleTable() {
  const me = useMe()
  const mayManage = useMay('people.manage')
  const { data: people = [] } = usePeople()
  const { data: invitations = [] } = useInvitations(mayManage)
  const [changed, setChanged] = useState<Person | null>(null)
  const [inviting, setInviting] = useState(false)

  const columns: Column<Person>[] = [
    {
      key: 'name',
      head: 'Name',
      sort: 'name',
      plain: ({ name }) => name,
      cell: ({ id, name }) => (id === me.id ? `${name} (you)` : name),
    },
    { key: 'email', head: 'E-mail', sort: 'email', plain: ({ email }) => email, wide: true, cell: ({ email }) => email },
    {
      key: 'roles',
      head: 'Roles',
      sort: 'roles',
      plain: rolesOf,
      cell: ({ roles, administrator, disabled }) =>
        disabled ? (
          <span className="text-brick">disabled</span>
        ) : (
          [...roles, ...(administrator ? ['administrator'] : [])].join(', ')
        ),
    },
  ]
  if (mayManage) {
    columns.push({
      key: 'do',
      head: <span className="sr-only">Actions</span>,
      cell: (person) => (
        <div className="flex justify-end">
          <Button look="quiet" aria-label={`Change ${person.name}`} onClick={() => setChanged(person)}>
            Change
          </Button>
        </div>
      ),
    })
  }
  const sorted = useLocalSort('people', people, columns)
  const withdrawn = async ({ id, email }: Invitation) => {
    try {
      await withdraw(id)
      toast(`The link for ${email} no longer works.`)
    } catch (error) {
      toast(problemOf(error).sentence, { tone: 'error' })
    }
  }
  return (
    <section aria-labelledby="people" className="border-t border-hair py-4">
      <div className="flex items-center justify-between gap-4">
        <h2 id="people" className="font-semibold text-lg">
          People
        </h2>
        <div className="flex gap-2">
          <ExportMenu name="people" columns={columns} align="right" all={async () => people} />
          {mayManage && (
            <Button look="main" onClick={() => setInviting(true)}>
              Invite
            </Button>
          )}
        </div>
      </div>
      <Table caption="People" columns={columns} {...sorted} rowKey={({ id }) => id} />
      {invitations.length > 0 && (
        <>
          <h3 className="mt-4 text-small font-semibold text-soft">Open invitations</h3>
          <ul>
            {invitations.map((invitation) => (
              <li key={invitation.id} className="flex flex-wrap items-center gap-x-4 border-b border-line">
                <span>{invitation.email}</span>
                <span className="text-small text-soft">
                  {invitation.roles.join(', ')} · runs out {formatDate(invitation.expiresAt, me.zone)}
                </span>
                <Button
                  look="quiet"
                  className="ml-auto"
                  aria-label={`Withdraw the invitation of ${invitation.email}`}
                  onClick={() => withdrawn(invitation)}
                >
                  Withdraw
                </Button>
              </li>
            ))}
          </ul>
        </>
      )}
      <Dialog title="Invite to the team" open={inviting} onClose={() => setInviting(false)}>
        {inviting && <InviteForm onClose={() => setInviting(false)} />}
      </Dialog>
      <Dialog title={changed?.name ?? ''} open={changed !== null} onClose={() => setChanged(null)}>
        {changed && <PersonForm person={changed} onDone={() => setChanged(null)} />}
      </Dialog>
    </section>
  )
}
