import { memo } from 'react'
import type { BoardStroke, StrokeLook } from './model'
import { type DrawingPoint, transformOf, type View } from './view'

const LOOKS: Record<StrokeLook, { className: string; width: number }> = {
  open: { className: 'stroke-brick', width: 1.6 },
  out: { className: 'stroke-hair', width: 1.2 },
  drawn: { className: 'stroke-ink', width: 1.6 },
}

const Path = memo(function Path({ look, path }: BoardStroke) {
  const { className, width } = LOOKS[look]
  return <path d={path} className={`fill-none ${className}`} strokeWidth={width} vectorEffect="non-scaling-stroke" />
})

/** Line work that makes no metal: open chains, outlines left out. */
export function Strokes({ strokes, origin, view }: { strokes: BoardStroke[]; origin: DrawingPoint; view: View }) {
  return (
    <g transform={transformOf(view, origin)}>
      {strokes.map((stroke) => (
        <Path key={stroke.look} {...stroke} />
      ))}
    </g>
  )
}
