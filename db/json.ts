import { z } from 'zod'

/** A JSON column, parsed. */
export const parseJson = <T extends z.ZodType>(text: string, schema: T): z.output<T> => schema.parse(JSON.parse(text))

const AnyRecord = z.record(z.string(), z.unknown())
export const parseRecord = (text: string): Record<string, unknown> => parseJson(text, AnyRecord)
