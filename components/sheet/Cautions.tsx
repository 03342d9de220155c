import type { Revision } from '@/lib/api/schemas/revision'

/** What the figures suppose, and who must check them; stands wherever figures are used. */
export function Cautions({ revision }: { revision: Pick<Revision, 'answer' | 'confirmation'> }) {
  const { section, recipe } = revision.answer
  const pieces = section?.pieces ?? 1
  const shrunk = recipe.shrinkage !== undefined && recipe.shrinkage !== 1
  return (
    <div className="border-hair border-t pt-3 text-small text-soft">
      <p>
        The figures suppose one homogeneous material, the nominal size as drawn{shrunk ? ' with the die’s shrinkage undone' : ''},
        and a cross-section that stays flat and keeps its shape.
        {pieces > 1 &&
          ` The section has ${pieces} pieces: every figure with a distance to a common axis supposes that they are joined and act as one; the sums without it stand beside.`}
      </p>
      <p className="mt-1">
        A competent person checks each figure before it is relied on. Local codes and licensed practice decide.
      </p>
    </div>
  )
}
