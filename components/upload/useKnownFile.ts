'use client'
import useSWR from 'swr'
import type { z } from 'zod'
import type { Uses } from '@/lib/api/answers'
import { getJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'

async function hashOf(file: File): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', await file.arrayBuffer())
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('')
}

/** Where the team already has this very file. Over plain http the browser has no hash: then the save says it. */
export function useKnownFile(file: File): z.infer<typeof Uses>['uses'] {
  const able = typeof crypto !== 'undefined' && 'subtle' in crypto
  const { data } = useSWR(able ? ['known file', file.name, file.size, file.lastModified] : null, async () =>
    getJson((answers) => answers.Uses)(keys.files(await hashOf(file))),
  )
  return data?.uses ?? []
}
