import { cautionsOf } from '@/lib/section/cautions'
import type { SectionAnswer } from '@/lib/section/types'

/** What the figures suppose, and who must check them. */
export function Cautions({ answer }: { answer: Pick<SectionAnswer, 'section' | 'recipe'> }) {
  return (
    <div className="grid gap-1 border-hair border-t pt-3 text-small text-soft">
      {cautionsOf(answer.section, { shrinkage: answer.recipe.shrinkage ?? 1 }).map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
    </div>
  )
}
