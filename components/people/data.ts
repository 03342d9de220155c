'use client'
import useSWR from 'swr'
import { type Choice, getJson, refresh, sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import type { Invitation, Invite, MeChange, Person, PersonChange, Team, TeamChange } from '@/lib/api/schemas/people'

const itemsOf =
  <T>(choice: Choice<{ items: T[] }>) =>
  async (path: string) =>
    (await getJson(choice)(path)).items

export const usePeople = () =>
  useSWR(
    keys.people,
    itemsOf(({ People }) => People),
  )
export const useInvitations = (may: boolean) =>
  useSWR(
    may ? keys.invitations : null,
    itemsOf(({ Invitations }) => Invitations),
  )

export async function invite(fields: Invite): Promise<Invitation> {
  const made = await sendJson('POST', keys.invitations, ({ Invitation }) => Invitation, { body: fields })
  await refresh(keys.invitations)
  return made
}

export async function withdraw(id: string): Promise<void> {
  await sendJson('DELETE', keys.invitation(id), ({ Anything }) => Anything)
  await refresh(keys.invitations)
}

export async function changePerson({ id, version }: Person, change: PersonChange): Promise<Person> {
  const person = await sendJson('PATCH', keys.person(id), ({ Person }) => Person, { body: change, version })
  await refresh(keys.people)
  return person
}

export const changeTeam = ({ version }: Team, change: TeamChange) =>
  sendJson('PATCH', keys.team, ({ Team }) => Team, { body: change, version })

export const changeMe = (change: MeChange) => sendJson('PATCH', keys.me, ({ Me }) => Me, { body: change })
