'use client'
import { Check } from '@/components/ui/Check'
import { Select } from '@/components/ui/Field'
import type { Recipe } from '@/lib/geometry/recipe'
import type { DrawingView } from '@/lib/jobs/browser-pool'
import type { FlowAction } from './flow/flow'
import { Panel } from './Panel'

type Tally = DrawingView['tallies']['layers'][number]

/** Which entities count: space, layers, line types, hatches; each with how many it holds. */
export function LayersPanel({
  drawing,
  recipe,
  dispatch,
}: {
  drawing: DrawingView
  recipe: Recipe
  dispatch: (action: FlowAction) => void
}) {
  const { tallies } = drawing
  const holds = ({ taken, left }: Tally) => taken + left > 0
  const layers = tallies.layers.filter(holds)
  const lineTypes = tallies.lineTypes.filter(holds)
  const spaces = tallies.spaces.filter(holds)
  const taken = (list: Tally[]) => list.reduce((sum, tally) => sum + tally.taken, 0)
  const left = (list: Tally[]) => list.reduce((sum, tally) => sum + tally.left, 0)
  return (
    <Panel
      title="Layers and line types"
      open={false}
      state={`${taken(layers)} ${taken(layers) === 1 ? 'entity' : 'entities'} taken, ${left(layers)} left out`}
    >
      {spaces.length > 1 && (
        <Select
          label="Drawn in"
          value={recipe.space}
          onChange={(event) => dispatch({ type: 'set', change: { space: event.target.value } })}
        >
          {tallies.spaces.map(({ name, taken: t, left: l }, i) => (
            <option key={name} value={i === 0 ? 'model' : name}>
              {i === 0 ? 'Model' : `Layout ${name}`} ({t + l})
            </option>
          ))}
        </Select>
      )}
      <Switches
        legend="Layers"
        tallies={layers}
        note={(name) => {
          const layer = drawing.layers.find((row) => row.name === name)
          return [layer?.off && 'off', layer?.frozen && 'frozen', layer && !layer.plots && 'does not plot']
            .filter(Boolean)
            .join(', ')
        }}
        chosen={recipe.layers}
        onSwitch={(name, on, names) => dispatch({ type: 'layer', name, on, taken: names })}
      />
      <Switches
        legend="Line types"
        tallies={lineTypes}
        chosen={recipe.lineTypes}
        onSwitch={(name, on, names) => dispatch({ type: 'lineType', name, on, taken: names })}
      />
      <Check
        label="Take the boundaries of hatches"
        checked={recipe.hatches}
        onChange={(event) => dispatch({ type: 'set', change: { hatches: event.target.checked } })}
      />
      <p className="text-small text-soft">
        Read: {listed(drawing.read)}.{Object.keys(drawing.ignored).length > 0 && ` No outlines: ${listed(drawing.ignored)}.`}
      </p>
    </Panel>
  )
}

const listed = (counts: Record<string, number>) =>
  Object.entries(counts)
    .map(([kind, count]) => `${count} ${kind}`)
    .join(', ') || 'nothing'

function Switches({
  legend,
  tallies,
  chosen,
  note = () => '',
  onSwitch,
}: {
  legend: string
  tallies: Tally[]
  chosen: string[] | null
  note?: (name: string) => string
  onSwitch: (name: string, on: boolean, taken: string[]) => void
}) {
  const isOn = (tally: Tally) =>
    chosen ? chosen.some((name) => name.toUpperCase() === tally.name.toUpperCase()) : tally.taken > 0
  const names = tallies.filter(isOn).map(({ name }) => name)
  return (
    <fieldset className="mt-2">
      <legend className="text-small font-semibold">{legend}</legend>
      {tallies.map((tally) => (
        <Check
          key={tally.name}
          checked={isOn(tally)}
          onChange={(event) => onSwitch(tally.name, event.target.checked, names)}
          label={
            <>
              {tally.name}{' '}
              <span className="text-small text-soft">
                {[String(tally.taken + tally.left), note(tally.name)].filter(Boolean).join(' · ')}
              </span>
            </>
          }
        />
      ))}
    </fieldset>
  )
}
