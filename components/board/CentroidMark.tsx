import { centroidMark } from './marks'
import { type DrawingPoint, toScreen, type View } from './view'

const MARK = centroidMark(7)

export function CentroidMark({ at, view }: { at: DrawingPoint; view: View }) {
  const { x, y } = toScreen(view, at)
  return (
    <g transform={`translate(${x} ${y})`} pointerEvents="none">
      <path d={MARK.circle} className="fill-sheet stroke-ink" strokeWidth={1.4} />
      <path d={MARK.quarters} className="fill-ink" />
    </g>
  )
}
