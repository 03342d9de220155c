'use client'
import useSWR from 'swr'
import { z } from 'zod'
import { getJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'

const Uses = z.object({ uses: z.array(z.object({ profileId: z.string(), number: z.string(), letter: z.string() })) })

async function hashOf(file: File): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await file.arrayBuffer())
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('')
}

/** Where the team already has this very file. Over plain http the browser has no hash: then the save says it. */
export function useKnownFile(file: File): z.infer<typeof Uses>['uses'] {
  const able = typeof crypto !== 'undefined' && 'subtle' in crypto
  const { data } = useSWR(able ? ['known file', file.name, file.size, file.lastModified] : null, async () =>
    getJson(Uses)(keys.files(await hashOf(file))),
  )
  return data?.uses ?? []
}
