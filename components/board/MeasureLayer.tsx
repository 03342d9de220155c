import { AnnotationLayer } from './AnnotationLayer'
import { drawDimension } from './dimensionLines'
import type { Snapped } from './snapper'
import { type DrawingPoint, type ScreenPoint, toScreen, type View } from './view'

function mark(kind: Snapped['kind'], { x, y }: ScreenPoint): string {
  if (kind === 'end') return `M${x - 5} ${y - 5}h10v10h-10Z`
  if (kind === 'middle') return `M${x} ${y - 6}l6 10h-12Z`
  if (kind === 'centre') return `M${x - 6} ${y}a6 6 0 1 0 12 0a6 6 0 1 0 -12 0`
  return `M${x - 5} ${y - 5}l10 10M${x - 5} ${y + 5}l10 -10`
}

/** The measured points, the dimension between them, and what the pointer would take. */
export function MeasureLayer({
  points,
  pointer,
  view,
  length,
}: {
  points: DrawingPoint[]
  pointer: Snapped | null
  view: View
  length: (mm: number) => string
}) {
  const ends = points.length === 1 && pointer ? [points[0], pointer.at] : points
  const [a, b] = ends.map((point) => toScreen(view, point))
  const text = ends.length === 2 ? length(Math.hypot(ends[1].x - ends[0].x, ends[1].y - ends[0].y)) : ''
  return (
    <g pointerEvents="none">
      {a && b && (
        <AnnotationLayer
          annotations={drawDimension({ id: 'measure', a, b, off: 0, text, look: 'hot', textLook: 'principal' })}
          choices={{}}
        />
      )}
      {points.map((point, k) => {
        const at = toScreen(view, point)
        return <circle key={String(k)} cx={at.x} cy={at.y} r={4} className="fill-accent" />
      })}
      {pointer && (
        <path d={mark(pointer.kind, toScreen(view, pointer.at))} className="fill-none stroke-accent" strokeWidth={1.8} />
      )}
    </g>
  )
}
