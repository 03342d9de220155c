'use client'
import useSWR from 'swr'
import { getJson, refresh, sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import type { Material, MaterialFields } from '@/lib/api/schemas/people'

export const useMaterials = () =>
  useSWR(keys.materials, async (path) => (await getJson(({ Materials }) => Materials)(path)).items)

/** Adds a material or, with the row as seen, changes it. */
export async function saveMaterial(fields: MaterialFields, seen?: Material): Promise<Material> {
  const saved = seen
    ? await sendJson('PATCH', keys.material(seen.id), ({ Material }) => Material, { body: fields, version: seen.version })
    : await sendJson('POST', keys.materials, ({ Material }) => Material, { body: fields })
  await refresh(keys.materials)
  return saved
}
