import { z } from 'zod'
import { RecipeInput } from './recipe'

const n = z.number()
const nn = z.number().nullable()
const xy = z.object({ x: n, y: n })

export const Finding = z.object({
  code: z.string(),
  severity: z.enum(['note', 'warning', 'error']),
  message: z.string(),
  params: z.record(z.string(), z.union([z.string(), z.number(), z.boolean(), z.null()])),
  at: z.tuple([n, n]).optional(),
  size: n.optional(),
})

export const Section = z.object({
  area: n,
  mass: n.optional(),
  perimeter: z.object({ outer: n, inner: n }),
  pieces: z.int(),
  extents: z.object({ minX: n, minY: n, maxX: n, maxY: n }),
  centroid: xy,
  ix: n,
  iy: n,
  ixy: n,
  ip: n,
  i1: n,
  i2: n,
  theta: nn,
  rx: n,
  ry: n,
  r1: n,
  r2: n,
  elastic: z.object({
    xTop: n,
    xBottom: n,
    yRight: n,
    yLeft: n,
    axis1Left: nn,
    axis1Right: nn,
    axis2Right: nn,
    axis2Left: nn,
  }),
  plastic: z.object({
    x: n,
    y: n,
    axis1: nn,
    axis2: nn,
    at: z.object({ x: n, y: n, axis1: nn, axis2: nn }),
    atRange: z.partialRecord(z.enum(['x', 'y', 'axis1', 'axis2']), z.tuple([n, n])).optional(),
  }),
  plasticShape: z.object({ x: n, y: n, axis1: nn, axis2: nn }),
  freePlastic: z.object({ x: n, y: n, angleX: n, angleY: n, restrainedMyForX: n, restrainedMxForY: n }),
  circle: z.object({ x: n, y: n, radius: n }),
  withoutSteiner: z.object({ ix: n, iy: n, ixy: n }).optional(),
  j: z.object({ value: n, lower: n, upper: n }).optional(),
  shearCentre: xy.optional(),
  iw: n.optional(),
  shearArea: xy.optional(),
  origin: z.record(
    z.string(),
    z.object({
      kind: z.enum(['exact', 'iterated', 'element']),
      estimate: z.literal(true).optional(),
      plusMinus: z.object({ digits: n.optional(), repairs: n.optional(), numerics: n.optional() }).optional(),
    }),
  ),
})

export const Outline = z.object({
  id: z.string(),
  layer: z.string(),
  edges: z.int(),
  area: n,
  depth: z.int().nullable(),
  at: z.tuple([n, n]),
  does: z.enum(['add', 'cut', 'common', 'out']).optional(),
})

export const SectionAnswer = z.object({
  engineVersion: z.string(),
  source: z.object({ name: z.string(), bytes: z.int(), sha256: z.string() }),
  recipe: RecipeInput,
  unit: z.object({ drawing: z.string(), mmPerUnit: n, declared: z.string() }),
  outlines: z.array(Outline),
  outlinesTotal: z.int(),
  findings: z.array(Finding),
  findingsTotal: z.int(),
  section: Section.nullable(),
})
