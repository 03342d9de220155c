import type { z } from 'zod'
import { AppError } from '@/lib/api/errors'
import { parse } from '@/lib/api/input'
import { RecipeInput } from '@/lib/api/schemas/recipe'
import { RevisionFields } from '@/lib/api/schemas/revision'

function jsonField<T>(fields: Map<string, string>, name: string, schema: z.ZodType<T>): T {
  try {
    return parse(schema, JSON.parse(fields.get(name) || '{}'))
  } catch (error) {
    if (error instanceof SyntaxError) throw new AppError('invalid', `The field “${name}” is not JSON.`)
    throw error
  }
}

/** The fields `recipe` and `fields` of an upload; what is left out takes its default. */
export const uploadForm = (fields: Map<string, string>) => ({
  recipe: jsonField(fields, 'recipe', RecipeInput),
  fields: jsonField(fields, 'fields', RevisionFields),
})
