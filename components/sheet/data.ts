'use client'
import { useMemo } from 'react'
import useSWR from 'swr'
import useSWRImmutable from 'swr/immutable'
import { getBytes, getJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import { unpackRegion } from '@/lib/geometry/pack'
import type { Region } from '@/lib/geometry/region'

export const eventsOf = (profileId: string) => keys.events({ subjectId: profileId, limit: 50 })

export const useProfile = (id: string) =>
  useSWR(
    keys.profile(id),
    getJson(({ Profile }) => Profile),
  )
export const useRevisions = (profileId: string) =>
  useSWR(
    keys.revisions(profileId),
    getJson(({ Revisions }) => Revisions),
  )
export const useRevision = (id: string | null) =>
  useSWR(
    id && keys.revision(id),
    getJson(({ Revision }) => Revision),
  )
export const useEvents = (profileId: string) =>
  useSWR(
    eventsOf(profileId),
    getJson(({ Events }) => Events),
  )

const getRegion = async (path: string): Promise<Region> => unpackRegion(new Uint8Array(await getBytes(path)))

const fromBase64 = (text: string) => Uint8Array.from(atob(text), (character) => character.charCodeAt(0))

/** The metal of a revision; it never changes, so it is read once. `packed`: its bytes in base64, where they came with the page. */
export function useRegion(revisionId: string | null, packed: string | null) {
  const came = useMemo(() => (packed ? unpackRegion(fromBase64(packed)) : undefined), [packed])
  return useSWRImmutable(revisionId && keys.region(revisionId), getRegion, { fallbackData: came })
}
