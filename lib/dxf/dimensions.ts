import type { Point } from '../geometry/edges'
import type { DrawnDimension, Layer } from './drawing'
import { readDimensionText, withoutFormatting } from './dimensionText'
import type { RawDimension } from './entities/dimension'
import { dxfFinding, quoted } from './findings'
import type { Reading } from './reading'
import type { DimensionStyle, FileFacts } from './tables'

const KIND_OF_TYPE: DrawnDimension['kind'][] = [
  'linear',
  'aligned',
  'angular',
  'diameter',
  'radius',
  'angular',
  'ordinate',
  'arc',
]
const NO_STYLE: DimensionStyle = { tolerances: false, plus: 0, minus: 0, factor: 1 }
const ORIGIN: Point = { x: 0, y: 0 }
/** Stored and measured sizes that differ by more than this share disagree. */
const AGREES = 1e-6
const DEGREES = 180 / Math.PI

/** Turns the dimensions of the model into evidence, and says where text or stored size contradict the drawing. */
export function drawnDimensions(
  reading: Reading,
  facts: FileFacts,
  layerOf: (raw: number) => Layer,
  read: (raw: string) => string,
): DrawnDimension[] {
  return reading.dimensions.flatMap((raw) => {
    const kind = KIND_OF_TYPE[raw.type]
    const fromPoints = measure(raw, kind)
    const angular = kind === 'angular'
    const stored = raw.stored !== null && raw.stored >= 0 ? (angular ? raw.stored * DEGREES : raw.stored) : null
    const measured = stored ?? fromPoints
    if (measured === null) return []
    const style = { ...(facts.dimensionStyles.get(raw.style.toUpperCase()) ?? NO_STYLE), ...raw.overrides }
    const text = read(raw.text)
    const says = readDimensionText(text)
    const layer = layerOf(raw.layer).name
    const at = raw.points[11] ?? raw.points[10] ?? ORIGIN
    const place: [number, number] = [at.x, at.y]
    if (stored !== null && fromPoints !== null && Math.abs(stored - fromPoints) > AGREES * Math.max(stored, fromPoints)) {
      const params = { layer: quoted(layer), stored, measured: fromPoints }
      reading.findings.add('dimension-stale', () => dxfFinding('dimension-stale', params, place))
    }
    const shown = angular ? measured : measured * Math.abs(style.factor)
    if (says.value !== null && Math.abs(says.value - shown) > says.rounding * 1.01 + AGREES * shown) {
      const params = {
        layer: quoted(layer),
        says: quoted(withoutFormatting(text).trim()),
        measured: shown,
        ratio: says.value / shown,
      }
      reading.findings.add('dimension-contradicts', () => dxfFinding('dimension-contradicts', params, place))
    }
    const fromStyle = style.tolerances ? { plus: style.plus, minus: style.minus } : null
    const [a, b] = ends(raw, kind)
    const tolerance = says.tolerance ?? fromStyle
    return [{ kind, measured, text, textValue: says.value, tolerance, layer, a, b, angle: raw.angle, at }]
  })
}

/** The two places that the dimension is between. */
function ends({ points }: RawDimension, kind: DrawnDimension['kind']): [Point, Point] {
  const [a, b] =
    kind === 'diameter' ? [points[15], points[10]] : kind === 'radius' ? [points[10], points[15]] : [points[13], points[14]]
  return [a ?? points[10] ?? ORIGIN, b ?? points[10] ?? ORIGIN]
}

/** The size from the definition points; null where they do not say. */
function measure(raw: RawDimension, kind: DrawnDimension['kind']): number | null {
  const { points } = raw
  const [a, b] = kind === 'diameter' || kind === 'radius' ? [points[10], points[15]] : [points[13], points[14]]
  if (kind === 'angular' || kind === 'arc' || !a || !b) return null
  const [dx, dy] = [b.x - a.x, b.y - a.y]
  if (kind === 'linear') {
    const angle = raw.angle / DEGREES
    return Math.abs(dx * Math.cos(angle) + dy * Math.sin(angle))
  }
  if (kind !== 'ordinate') return Math.hypot(dx, dy)
  const origin = points[10]
  return origin ? Math.abs(raw.ordinateX ? a.x - origin.x : a.y - origin.y) : null
}
