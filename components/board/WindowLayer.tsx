import { type DrawingPoint, type ScreenPoint, toScreen, type View } from './view'

const CROSS = 8

/** The window from its first corner to the pointer; a cross where the first corner would be. */
export function WindowLayer({ corner, pointer, view }: { corner: DrawingPoint | null; pointer: ScreenPoint | null; view: View }) {
  if (!pointer) return null
  const { x, y } = pointer
  if (!corner) return <path d={`M${x - CROSS} ${y}h${2 * CROSS}M${x} ${y - CROSS}v${2 * CROSS}`} className="stroke-accent" />
  const from = toScreen(view, corner)
  return (
    <path
      d={`M${from.x} ${from.y}H${x}V${y}H${from.x}Z`}
      className="fill-accent stroke-accent"
      fillOpacity={0.08}
      strokeDasharray="6 4"
      pointerEvents="none"
    />
  )
}
