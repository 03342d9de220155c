import { z } from 'zod'
import { Id, Timestamp, Version } from './common'

const title = z.string().trim().min(1).max(160)
const client = z.string().trim().max(160)

export const JobFields = z.strictObject({ title, client: client.default('') })
export const JobChange = z.strictObject({ title, client }).partial()
export const Job = z.object({
  id: Id,
  number: z.string(),
  title: z.string(),
  client: z.string(),
  profiles: z.int(),
  createdAt: Timestamp,
  updatedAt: Timestamp,
  binnedAt: Timestamp.nullable(),
  version: Version,
})
export const JobQuery = z.object({
  q: z.string().max(200).optional(),
  sort: z.enum(['number', 'title', 'updatedAt']).default('updatedAt'),
  dir: z.enum(['asc', 'desc']).default('desc'),
  cursor: z.string().optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  bin: z.stringbool().default(false),
})
export type JobFields = z.infer<typeof JobFields>
export type Job = z.infer<typeof Job>
export type JobQuery = z.infer<typeof JobQuery>
export type JobChange = z.infer<typeof JobChange>
