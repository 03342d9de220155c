'use client'
import type { Recipe } from '@/lib/geometry/recipe'
import type { FlowAction } from './flow/flow'
import { NumberChoice } from './NumberChoice'
import { Panel } from './Panel'

/** How far apart two ends may lie and still be joined. */
export function TolerancePanel({
  recipe,
  gaps,
  dispatch,
}: {
  recipe: Recipe
  gaps: number
  dispatch: (action: FlowAction) => void
}) {
  return (
    <Panel title="Gaps" open={false} state={`${gaps} closed, up to ${recipe.tolerance} mm`}>
      <NumberChoice
        label="Join ends up to"
        unit="mm"
        hint="Recorded with the revision; each gap closed is a finding with what it decides."
        value={recipe.tolerance}
        allow={(tolerance) => tolerance >= 0 && tolerance <= 100}
        onChoose={(tolerance) => dispatch({ type: 'set', change: { tolerance } })}
      />
    </Panel>
  )
}
