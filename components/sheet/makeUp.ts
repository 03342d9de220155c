import type { Does } from '@/lib/geometry/recipe'
import type { SectionAnswer } from '@/lib/section/types'

/** What an outline does, in a word; by nesting depth where the recipe leaves it to the drawing. */
export function roleOf(answer: Pick<SectionAnswer, 'recipe' | 'outlines'>, id: string): Does | null {
  const outline = answer.outlines.find((row) => row.id === id)
  if (!outline) return null
  const { makeUp } = answer.recipe
  if (makeUp === null) return outline.depth === null ? null : outline.depth % 2 === 0 ? 'add' : 'cut'
  const step = makeUp.find(({ at }) => nearestTo(answer, at) === id)
  return step?.does ?? 'out'
}

/** The outline whose named point lies nearest to a step's. */
function nearestTo({ outlines }: Pick<SectionAnswer, 'outlines'>, [x, y]: readonly [number, number]): string | null {
  let nearest: string | null = null
  let least = Number.POSITIVE_INFINITY
  for (const { id, at } of outlines) {
    const distance = Math.hypot(at[0] - x, at[1] - y)
    if (distance < least) {
      least = distance
      nearest = id
    }
  }
  return nearest
}
