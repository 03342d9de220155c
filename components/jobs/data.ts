'use client'
import { useEffect, useRef } from 'react'
import useSWR from 'swr'
import { getJson, refresh, sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import type { JobChange, JobFields } from '@/lib/api/schemas/job'
import type { OpenIntake } from '@/lib/api/schemas/revision'
import type { ProfileChange, ProfileFields } from '@/lib/api/schemas/profile'

export const JOBS = keys.jobs()
export const PROFILES = keys.profiles()

export const useJobs = (path: string) =>
  useSWR(
    path,
    getJson(({ Jobs }) => Jobs),
    { keepPreviousData: true },
  )
export const useJob = (id: string) =>
  useSWR(
    keys.job(id),
    getJson(({ Job }) => Job),
  )
export const useProfiles = (path: string) =>
  useSWR(
    path,
    getJson(({ Profiles }) => Profiles),
    { keepPreviousData: true },
  )

const POLL = 2000

/** One's own uploads that the server still computes; asked again while there are any, and the lists with the last one's end. */
export function useIntakes(may: boolean): OpenIntake[] {
  const { data } = useSWR(
    may ? keys.intakes : null,
    getJson(({ Intakes }) => Intakes),
    {
      refreshInterval: (latest) => (latest && latest.items.length > 0 ? POLL : 0),
    },
  )
  const items = data?.items ?? []
  const before = useRef(0)
  useEffect(() => {
    if (items.length < before.current) void refresh(PROFILES)
    before.current = items.length
  }, [items.length])
  return items
}

/** Every row of a list, page after page. */
async function everything<T>(
  api: string,
  query: URLSearchParams,
  read: (path: string) => Promise<{ items: T[]; next: string | null }>,
) {
  const rows: T[] = []
  const asking = new URLSearchParams(query)
  asking.set('limit', '200')
  asking.delete('cursor')
  for (;;) {
    const { items, next } = await read(`${api}?${asking.toString()}`)
    rows.push(...items)
    if (next === null) return rows
    asking.set('cursor', next)
  }
}
export const allJobs = (query: URLSearchParams) =>
  everything(
    JOBS,
    query,
    getJson(({ Jobs }) => Jobs),
  )
export const allProfiles = (query: URLSearchParams) =>
  everything(
    PROFILES,
    query,
    getJson(({ Profiles }) => Profiles),
  )

interface Seen {
  id: string
  version: number
}
const lists = () => Promise.all([refresh(JOBS), refresh(PROFILES)])

async function then<T>(written: Promise<T>): Promise<T> {
  const row = await written
  await lists()
  return row
}
export const openJob = (fields: JobFields) => then(sendJson('POST', JOBS, ({ Job }) => Job, { body: fields }))
export const changeJob = ({ id, version }: Seen, change: JobChange) =>
  then(sendJson('PATCH', keys.job(id), ({ Job }) => Job, { body: change, version }))
export const binJob = ({ id, version }: Seen) => then(sendJson('DELETE', keys.job(id), ({ Job }) => Job, { version }))
export const restoreJob = (id: string) => then(sendJson('POST', keys.restoreJob(id), ({ Job }) => Job))

export const addProfile = (fields: ProfileFields) => then(sendJson('POST', PROFILES, ({ Profile }) => Profile, { body: fields }))
export const changeProfile = ({ id, version }: Seen, change: ProfileChange) =>
  then(sendJson('PATCH', keys.profile(id), ({ Profile }) => Profile, { body: change, version }))
export const binProfile = ({ id, version }: Seen) =>
  then(sendJson('DELETE', keys.profile(id), ({ Profile }) => Profile, { version }))
export const restoreProfile = (id: string) => then(sendJson('POST', keys.restoreProfile(id), ({ Profile }) => Profile))
