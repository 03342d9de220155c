import { z } from 'zod'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'

const XY = z.tuple([z.number(), z.number()])
const positive = z.number().positive().max(1e9)

/** A recipe as API, command line and screens give it: fields left out take their defaults. */
export const RecipeInput = z.strictObject({
  unit: z.union([z.enum(['mm', 'cm', 'm', 'in', 'ft']), positive]).default(DEFAULT_RECIPE.unit),
  scale: positive.default(1),
  shrinkage: z.number().min(0.5).max(2).default(1),
  tolerance: z.number().min(0).max(100).default(DEFAULT_RECIPE.tolerance),
  layers: z.array(z.string()).nullable().default(null),
  lineTypes: z.array(z.string()).nullable().default(null),
  space: z.string().default('model'),
  part: z.array(XY).nullable().default(null),
  turn: z.number().min(-360).max(360).default(0),
  arcs: z.array(z.strictObject({ from: XY, through: XY, to: XY })).default([]),
  hatches: z.boolean().default(false),
  bonds: z.array(z.strictObject({ at: XY, is: z.enum(['metal', 'void', 'bonded', 'contact']) })).default([]),
  makeUp: z
    .array(z.strictObject({ at: XY, does: z.enum(['add', 'cut', 'common', 'out']), material: z.string().optional() }))
    .nullable()
    .default(null),
  material: z.string().nullable().default(null),
})
export type RecipeInput = z.input<typeof RecipeInput>
