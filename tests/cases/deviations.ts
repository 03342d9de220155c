import type { Accept, Figures } from './reference'

/** Every figure that is not within its accepted error, by the rule of fixtures/cases/README.md. Empty: all are right. */
export function deviations(got: Figures, wanted: Figures, accept: Accept): string[] {
  const found: string[] = []
  const check = (name: string, value: number | null | undefined, expected: number | null, allowed: number) => {
    if (expected === null || value === null || value === undefined) {
      if ((value ?? null) !== expected) found.push(`${name}: got ${value}, wanted ${expected}`)
    } else if (!(Math.abs(value - expected) <= allowed)) {
      found.push(`${name}: got ${value}, wanted ${expected}: off by ${Math.abs(value - expected)}, allowed ${allowed}`)
    }
  }
  const relative = (name: string, value: number | null, expected: number | null, accepted: number) =>
    check(name, value, expected, accepted * Math.abs(expected ?? 0))
  const { radius } = wanted.circle

  relative('area', got.area, wanted.area, accept.area)
  const wholePerimeter = accept.perimeter * (wanted.perimeter.outer + wanted.perimeter.inner)
  relative('perimeter.outer', got.perimeter.outer, wanted.perimeter.outer, accept.perimeter)
  if (wanted.perimeter.inner === 0) check('perimeter.inner', got.perimeter.inner, 0, wholePerimeter)
  else relative('perimeter.inner', got.perimeter.inner, wanted.perimeter.inner, accept.perimeter)
  for (const side of ['minX', 'minY', 'maxX', 'maxY'] as const) {
    check(`extents.${side}`, got.extents[side], wanted.extents[side], accept.extents * radius)
  }
  for (const axis of ['x', 'y'] as const) {
    check(`centroid.${axis}`, got.centroid[axis], wanted.centroid[axis], accept.centroid * radius)
    check(`circle.${axis}`, got.circle[axis], wanted.circle[axis], accept.circle * radius)
  }
  relative('circle.radius', got.circle.radius, radius, accept.circle)
  for (const key of ['ix', 'iy', 'ip', 'i1', 'i2'] as const) relative(key, got[key], wanted[key], accept.second)
  check('ixy', got.ixy, wanted.ixy, accept.second * wanted.ip)
  for (const key of ['rx', 'ry', 'r1', 'r2'] as const) relative(key, got[key], wanted[key], accept.radii)

  const flipped = isHalfTurn(got.theta, wanted.theta)
  const theta = flipped && got.theta !== null ? got.theta + 180 * Math.sign((wanted.theta ?? 0) - got.theta) : got.theta
  check('theta', theta, wanted.theta, accept.thetaDegrees)
  for (const key of ['xTop', 'xBottom', 'yRight', 'yLeft'] as const) {
    relative(`elastic.${key}`, got.elastic[key], wanted.elastic[key], accept.elastic)
  }
  for (const [key, other] of SIDES) {
    relative(`elastic.${key}`, got.elastic[flipped ? other : key], wanted.elastic[key], accept.elastic)
  }
  for (const axis of ['x', 'y', 'axis1', 'axis2'] as const) {
    relative(`plastic.${axis}`, got.plastic[axis], wanted.plastic[axis], accept.plastic)
    const sign = flipped && axis.startsWith('axis') ? -1 : 1
    const at = got.plastic.at[axis]
    check(`plastic.at.${axis}`, at === null ? at : sign * at, wanted.plastic.at[axis], accept.plastic * radius)
    const range = wanted.plastic.atRange?.[axis]
    range?.forEach((end, k) => {
      check(`plastic.atRange.${axis}.${k}`, got.plastic.atRange?.[axis]?.[k], end, accept.plastic * radius)
    })
  }
  return found
}

const SIDES = [
  ['axis1Left', 'axis1Right'],
  ['axis1Right', 'axis1Left'],
  ['axis2Right', 'axis2Left'],
  ['axis2Left', 'axis2Right'],
] as const

/** Angles modulo 180°: where they differ by half a turn, left and right of both axes change places. */
const isHalfTurn = (a: number | null, b: number | null) => a !== null && b !== null && Math.abs(Math.abs(a - b) - 180) < 90
