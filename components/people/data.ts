'use client'
import useSWR from 'swr'
import { z } from 'zod'
import { getJson, refresh, sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import {
  Invitation,
  type Invite,
  Me,
  type MeChange,
  Person,
  type PersonChange,
  Team,
  type TeamChange,
} from '@/lib/api/schemas/people'

const itemsOf =
  <T>(schema: z.ZodType<{ items: T[] }>) =>
  async (path: string) =>
    (await getJson(schema)(path)).items
const People = z.object({ items: z.array(Person) })
const Invitations = z.object({ items: z.array(Invitation) })

export const usePeople = () => useSWR(keys.people, itemsOf(People))
export const useInvitations = (may: boolean) => useSWR(may ? keys.invitations : null, itemsOf(Invitations))

export async function invite(fields: Invite): Promise<Invitation> {
  const made = await sendJson('POST', keys.invitations, Invitation, { body: fields })
  await refresh(keys.invitations)
  return made
}

export async function withdraw(id: string): Promise<void> {
  await sendJson('DELETE', keys.invitation(id), z.unknown())
  await refresh(keys.invitations)
}

export async function changePerson({ id, version }: Person, change: PersonChange): Promise<Person> {
  const person = await sendJson('PATCH', keys.person(id), Person, { body: change, version })
  await refresh(keys.people)
  return person
}

export const changeTeam = ({ version }: Team, change: TeamChange) => sendJson('PATCH', keys.team, Team, { body: change, version })

export const changeMe = (change: MeChange) => sendJson('PATCH', keys.me, Me, { body: change })
