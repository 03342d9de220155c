import { z } from 'zod'
import { Id, Timestamp, Version } from './common'

const fields = {
  jobId: Id,
  title: z.string().trim().min(1).max(160),
  materialId: Id.nullable(),
  ownerId: Id,
  drawingNumber: z.string().trim().max(80),
}
export const ProfileFields = z.strictObject({
  ...fields,
  materialId: fields.materialId.default(null),
  ownerId: fields.ownerId.optional(),
  drawingNumber: fields.drawingNumber.default(''),
})
export const ProfileChange = z.strictObject(fields).partial()

/** The figures a list shows and sorts by: those of the newest revision, null before there is one. */
export const ProfileFigures = z.object({
  area: z.number(),
  mass: z.number().nullable(),
  ix: z.number(),
  iy: z.number(),
  i1: z.number(),
  i2: z.number(),
  theta: z.number().nullable(),
  /** diameter of the circumscribing circle, mm */
  circle: z.number(),
})
export const Profile = z.object({
  id: Id,
  number: z.string(),
  title: z.string(),
  drawingNumber: z.string(),
  job: z.object({ id: Id, number: z.string(), title: z.string() }),
  material: z.object({ id: Id, name: z.string() }).nullable(),
  owner: z.object({ id: Id, name: z.string() }),
  latest: z.object({ id: Id, letter: z.string(), state: z.string(), createdAt: Timestamp, figures: ProfileFigures }).nullable(),
  revisions: z.int(),
  createdAt: Timestamp,
  updatedAt: Timestamp,
  binnedAt: Timestamp.nullable(),
  version: Version,
})
/** `q` takes words and conditions on figures: `mullion ix>=40cm4 mass<=2.1`. */
export const ProfileQuery = z.object({
  q: z.string().max(200).optional(),
  jobId: Id.optional(),
  ownerId: Id.optional(),
  materialId: Id.optional(),
  sort: z.enum(['number', 'title', 'updatedAt', 'area', 'mass', 'ix', 'iy', 'circle']).default('updatedAt'),
  dir: z.enum(['asc', 'desc']).default('desc'),
  cursor: z.string().optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
  bin: z.stringbool().default(false),
})
export type ProfileFields = z.infer<typeof ProfileFields>
export type ProfileChange = z.infer<typeof ProfileChange>
export type Profile = z.infer<typeof Profile>
export type ProfileQuery = z.infer<typeof ProfileQuery>
