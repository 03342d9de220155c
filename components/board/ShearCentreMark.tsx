import { classes } from '@/components/ui/classes'
import type { HoverStore } from './hover'
import { shearCentreMark } from './marks'
import { useHover } from './useHover'
import { type DrawingPoint, toScreen, type View } from './view'

const MARK = shearCentreMark(4)

/** Where a force must pass not to twist the member; it stands out while one of its figures is pointed at. */
export function ShearCentreMark({ at, view, hover }: { at: DrawingPoint; view: View; hover: HoverStore }) {
  const hot = useHover(hover, (hovered) => hovered?.kind === 'figure' && /^(shearCentre|iw)/.test(hovered.key))
  const { x, y } = toScreen(view, at)
  return (
    <g transform={`translate(${x} ${y})`} pointerEvents="none" data-mark="shear centre">
      <path d={MARK} fill="none" className={classes(hot ? 'stroke-accent' : 'stroke-ink')} strokeWidth={hot ? 2.4 : 1.2} />
    </g>
  )
}
