import type { Does, MakeUpStep, XY } from '@/lib/geometry/recipe'
import type { OutlineView } from '@/lib/section/types'

const same = (a: XY, b: XY) => a[0] === b[0] && a[1] === b[1]
const byNesting = (depth: number | null): Does => (depth === null ? 'out' : depth % 2 === 0 ? 'add' : 'cut')

/**
 * The make-up as a list of steps, in order: the one a person stated, else nesting's, outside first.
 * Outlines that the stated one does not name follow at the end, left out.
 */
export function stepsOf(makeUp: MakeUpStep[] | null, outlines: readonly OutlineView[]): MakeUpStep[] {
  if (!makeUp) {
    const order = [...outlines].sort((a, b) => (a.depth ?? Number.POSITIVE_INFINITY) - (b.depth ?? Number.POSITIVE_INFINITY))
    return order.map(({ at, depth }) => ({ at, does: byNesting(depth) }))
  }
  const unnamed = outlines.filter(({ at }) => !makeUp.some((step) => same(step.at, at)))
  return [...makeUp, ...unnamed.map(({ at }): MakeUpStep => ({ at, does: 'out' }))]
}

export function withRole(steps: readonly MakeUpStep[], at: XY, does: Does): MakeUpStep[] {
  return steps.map((step) => (same(step.at, at) ? { ...step, does } : step))
}

export function withMaterial(steps: readonly MakeUpStep[], at: XY, material: string | null): MakeUpStep[] {
  return steps.map((step) => (same(step.at, at) ? { at: step.at, does: step.does, ...(material ? { material } : {}) } : step))
}

/** The step of outline `at` moved up (−1) or down (+1) in the order. */
export function moved(steps: readonly MakeUpStep[], at: XY, by: -1 | 1): MakeUpStep[] {
  const from = steps.findIndex((step) => same(step.at, at))
  const to = from + by
  if (from < 0 || to < 0 || to >= steps.length) return [...steps]
  const next = [...steps]
  next.splice(to, 0, ...next.splice(from, 1))
  return next
}

/** The outline a step names: outlines of this answer are named by the very point they carry. */
export const outlineOf = (step: MakeUpStep, outlines: readonly OutlineView[]) =>
  outlines.find(({ at }) => same(at, step.at)) ?? nearest(step.at, outlines)

function nearest([x, y]: XY, outlines: readonly OutlineView[]): OutlineView | undefined {
  let best: OutlineView | undefined
  let least = Number.POSITIVE_INFINITY
  for (const outline of outlines) {
    const distance = Math.hypot(outline.at[0] - x, outline.at[1] - y)
    if (distance < least) {
      least = distance
      best = outline
    }
  }
  return best
}
