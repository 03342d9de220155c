import { FIGURES } from '../section/figures'
import type { Dimension } from '../section/figures/figure'
import type { Section } from '../section/types'

const TOLERANCE = 1e-12
const DEGREES = 90

/** How large figures of a kind are in this section: what rounding is measured by. */
function scaleOf(dimension: Dimension, section: Section, value: number): number {
  const { extents, circle, area, ip, i1, i2 } = section
  const length = Math.max(...Object.values(extents).map(Math.abs), circle.radius)
  switch (dimension) {
    case 'length':
      return length
    case 'area':
      return area
    case 'modulus':
      return ip / circle.radius
    case 'secondMoment':
      return ip
    case 'angle':
      return (DEGREES * ip) / Math.max(i1 - i2, Number.MIN_VALUE)
    case 'count':
      return 0
    default:
      return Math.abs(value)
  }
}

/**
 * The figures in which what the browser showed differs from the server's section by more than rounding
 * (1e-12 of the figure's scale: sines differ in the last bit between runtimes). Figures it did not show are not asked.
 */
export function disagreements(section: Section, shown: Record<string, number | null>): string[] {
  return FIGURES.filter(({ key, value, dimension, origin }) => {
    if (!(key in shown)) return false
    const [got, wanted] = [shown[key], value(section) ?? null]
    if (got === null || wanted === null) return got !== wanted
    // another last bit can make another mesh: element figures agree within their own ±
    const allowed = origin === 'element' ? 2 * (section.origin[key]?.plusMinus?.numerics ?? 0) : 0
    return !(Math.abs(got - wanted) <= Math.max(allowed, TOLERANCE * scaleOf(dimension, section, wanted)))
  }).map(({ key }) => key)
}
