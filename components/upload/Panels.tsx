'use client'
import type { HoverStore } from '@/components/board/hover'
import type { XY } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import { ArcsPanel } from './ArcsPanel'
import { FindingsPanel } from './FindingsPanel'
import type { Choices, FlowAction } from './flow/flow'
import type { Detail } from './flow/groups'
import { LayersPanel } from './LayersPanel'
import { MakeUpPanel } from './MakeUpPanel'
import { PartPanel } from './PartPanel'
import { SizePanel } from './SizePanel'
import { TolerancePanel } from './TolerancePanel'

/** The questions of the flow, in the order in which they are best answered. */
export function Panels({
  result,
  choices,
  details,
  made,
  hover,
  picked,
  measured,
  windowing,
  zoneOf,
  dispatch,
  onShow,
  onWindow,
}: {
  result: PreviewResult
  choices: Choices
  details: Detail[]
  made: ReadonlyMap<number, string>
  hover: HoverStore
  picked: string | null
  measured: number | null
  windowing: boolean
  zoneOf: (at: XY) => string
  dispatch: (action: FlowAction) => void
  onShow: (at: XY, size: number) => void
  onWindow: () => void
}) {
  const { recipe } = choices
  return (
    <>
      <FindingsPanel {...{ result, hover, zoneOf, dispatch, onShow }} />
      <PartPanel {...{ result, details, windowing, dispatch, onShow, onWindow }} frames={choices.frames} saved={made} />
      <SizePanel {...{ result, choices, measured, dispatch, onShow }} />
      <MakeUpPanel {...{ result, hover, picked, dispatch }} />
      <ArcsPanel {...{ result, recipe, dispatch, onShow }} declined={choices.declined} />
      <LayersPanel drawing={result.drawing} {...{ recipe, dispatch }} />
      <TolerancePanel {...{ recipe, dispatch }} gaps={result.outlines.repairs.length} />
    </>
  )
}
