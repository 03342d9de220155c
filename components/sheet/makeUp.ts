import type { Does } from '@/lib/geometry/recipe'
import type { SectionAnswer } from '@/lib/section/types'

/** What an outline does; where an older answer does not tell, by nesting depth, or null where a person stated it. */
export function roleOf({ outlines, recipe }: Pick<SectionAnswer, 'recipe' | 'outlines'>, id: string): Does | null {
  const outline = outlines.find((row) => row.id === id)
  if (!outline) return null
  if (outline.does) return outline.does
  if (recipe.makeUp !== null || outline.depth === null) return null
  return outline.depth % 2 === 0 ? 'add' : 'cut'
}
