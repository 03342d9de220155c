import { AnnotationLayer } from './AnnotationLayer'
import { drawDimension } from './dimensionLines'
import { placeLabels, type Segment } from './labels'
import type { Snapped } from './snapper'
import { type DrawingPoint, type ScreenPoint, toScreen, type View, type Viewport } from './view'

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
  viewport,
  lines,
  length,
}: {
  points: DrawingPoint[]
  pointer: Snapped | null
  view: View
  viewport: Viewport
  /** what the figure must not lie on */
  lines: Segment[]
  length: (mm: number) => string
}) {
  const ends = points.length === 1 && pointer ? [points[0], pointer.at] : points
  const [a, b] = ends.map((point) => toScreen(view, point))
  const text = ends.length === 2 ? length(Math.hypot(ends[1].x - ends[0].x, ends[1].y - ends[0].y)) : ''
  const dimension = a && b && drawDimension({ id: 'measure', a, b, off: 0, text, look: 'hot', textLook: 'principal' })
  return (
    <g pointerEvents="none">
      {dimension && (
        <AnnotationLayer
          annotations={dimension}
          choices={placeLabels(dimension.labels, [...lines, ...dimension.lines], viewport)}
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
