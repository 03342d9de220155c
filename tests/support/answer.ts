import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { ENGINE_VERSION } from '@/lib/section/engineVersion'
import type { Section, SectionAnswer } from '@/lib/section/types'

/** A rectangle b wide and h high, its corner at the origin: closed forms, for tests of what stores and shows figures. */
export function rectangleSection(b: number, h: number, density?: number): Section {
  const area = b * h
  const [ix, iy] = [(b * h ** 3) / 12, (h * b ** 3) / 12]
  const [i1, i2] = [Math.max(ix, iy), Math.min(ix, iy)]
  const theta = ix >= iy ? 0 : 90
  const [wx, wy] = [(b * h ** 2) / 6, (h * b ** 2) / 6]
  const [zx, zy] = [1.5 * wx, 1.5 * wy]
  const [w1, w2, z1, z2] = ix >= iy ? [wx, wy, zx, zy] : [wy, wx, zy, zx]
  return {
    area,
    ...(density ? { mass: area * density * 1e-6 } : {}),
    perimeter: { outer: 2 * (b + h), inner: 0 },
    pieces: 1,
    extents: { minX: 0, minY: 0, maxX: b, maxY: h },
    centroid: { x: b / 2, y: h / 2 },
    ix,
    iy,
    ixy: 0,
    ip: ix + iy,
    i1,
    i2,
    theta,
    rx: Math.sqrt(ix / area),
    ry: Math.sqrt(iy / area),
    r1: Math.sqrt(i1 / area),
    r2: Math.sqrt(i2 / area),
    elastic: { xTop: wx, xBottom: wx, yRight: wy, yLeft: wy, axis1Left: w1, axis1Right: w1, axis2Right: w2, axis2Left: w2 },
    plastic: { x: zx, y: zy, axis1: z1, axis2: z2, at: { x: 0, y: 0, axis1: 0, axis2: 0 } },
    plasticShape: { x: 1.5, y: 1.5, axis1: 1.5, axis2: 1.5 },
    freePlastic: { x: zx, y: zy, angleX: 0, angleY: 90, restrainedMyForX: 0, restrainedMxForY: 0 },
    circle: { x: b / 2, y: h / 2, radius: Math.hypot(b, h) / 2 },
    origin: {},
  }
}

export const answerWith = (section: Section, sha256 = '0'.repeat(64)): SectionAnswer => ({
  engineVersion: ENGINE_VERSION,
  source: { name: 'rectangle.dxf', bytes: 3, sha256 },
  recipe: DEFAULT_RECIPE,
  unit: { drawing: 'mm', mmPerUnit: 1, declared: 'mm' },
  outlines: [],
  outlinesTotal: 0,
  findings: [],
  findingsTotal: 0,
  section,
})
