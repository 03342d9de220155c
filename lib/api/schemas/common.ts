import { z } from 'zod'

/** 128 random bits as 26 lower-case base32 characters. */
export const Id = z.string().regex(/^[a-z2-7]{26}$/)
/** The parameters of a route about one thing. */
export const ById = z.object({ id: Id })
export const Timestamp = z.iso.datetime({ precision: 3 })
export const Version = z.int().positive()

/** A page of a list; `next` is the cursor of the following page. */
export const page = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), next: z.string().nullable(), total: z.int() })

export const Problem = z
  .object({
    type: z.string(),
    title: z.string(),
    status: z.int(),
    detail: z.string().optional(),
    code: z.string(),
    requestId: z.string(),
  })
  .loose()
export type Problem = z.infer<typeof Problem>
