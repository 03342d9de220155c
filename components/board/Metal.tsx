import { memo, useMemo } from 'react'
import { hatchLines, hatchShift } from './marks'
import { type DrawingPoint, toScreen, transformOf, type View, type Viewport } from './view'

/** Hatch lines lie this far apart on the screen, whatever the zoom, px. */
const SPACING = 7

const Fill = memo(function Fill({ path }: { path: string }) {
  return <path d={path} className="fill-metal" />
})
const Outline = memo(function Outline({ path }: { path: string }) {
  return (
    <path d={path} className="fill-none stroke-ink" strokeWidth={1.9} strokeLinejoin="round" vectorEffect="non-scaling-stroke" />
  )
})

/** Cut metal: a soft fill, a 45° hatch of fixed density, a thick outline. Moving it changes three transforms only. */
export function Metal({
  id,
  path,
  origin,
  view,
  viewport,
}: {
  id: string
  path: string
  origin: DrawingPoint
  view: View
  viewport: Viewport
}) {
  const lines = useMemo(() => hatchLines(viewport.width, viewport.height, SPACING), [viewport])
  const transform = transformOf(view, origin)
  if (!path) return null
  return (
    <>
      <clipPath id={id}>
        <path d={path} transform={transform} />
      </clipPath>
      <g transform={transform}>
        <Fill path={path} />
      </g>
      <g clipPath={`url(#${id})`}>
        <path
          d={lines}
          transform={`translate(${hatchShift(toScreen(view, origin), SPACING)} 0)`}
          className="fill-none stroke-ink"
          strokeWidth={0.7}
          strokeOpacity={0.5}
        />
      </g>
      <g transform={transform}>
        <Outline path={path} />
      </g>
    </>
  )
}
