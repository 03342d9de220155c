'use client'
import { useMemo } from 'react'
import { bundlesOf } from '@/lib/section/bundles'
import { shareOf } from '@/lib/section/share'
import { along, left, lineTo, moveTo } from './annotation'
import { type AxisId, axesOf } from './axesOf'
import { type Frame, reachOf } from './axisLines'
import type { BoardModel } from './model'
import { directionOnScreen, type ScreenPoint, toScreen, type Viewport } from './view'

const BANDS = 48
/** Length of the longest bar, and how far beyond the metal the bars stand, px. */
const LONGEST = 64
const BEYOND = 112
/** Kept free at the edges of the board, px. */
const ROOM = 20

/** Distances of bands are counted along +y for x, +x for y, axis 2 for axis 1, axis 1 for axis 2: to its left, or to its right. */
const SIDE: Record<AxisId, 1 | -1> = { x: 1, y: -1, axis1: 1, axis2: -1 }

/**
 * Where along the axis the bars stand, px from the centroid: as far out as the whole row of them is still in view, on the side of
 * the axis' name if it can be.
 */
function baseOf(
  centre: ScreenPoint,
  d: ScreenPoint,
  reaches: number[],
  far: { from: number; to: number },
  { width, height }: Viewport,
): number {
  const inView = (t: number) =>
    reaches.every((v) => {
      const { x, y } = along(along(centre, d, t), left(d), v)
      return x >= ROOM && x <= width - ROOM && y >= ROOM && y <= height - ROOM
    })
  for (let part = 1; part > 0.2; part -= 0.05) {
    if (inView(part * far.to)) return part * far.to
    if (inView(part * far.from)) return part * far.from
  }
  return Math.min(far.to, Math.min(width, height) / 2 - ROOM)
}

/** Bars across an axis, level with the metal they speak of: how much of the second moment each band gives. */
export function ShareLayer({ model, axis: id, frame }: { model: BoardModel; axis: AxisId; frame: Frame }) {
  const { region, section } = model
  const theta = section?.theta ?? null
  const bands = useMemo(() => (region ? shareOf(bundlesOf(region), theta, id, BANDS) : []), [region, theta, id])
  const axis = section && axesOf(section)[id]
  if (!axis || bands.length === 0) return null
  const centre = toScreen(frame.view, axis.through)
  const d = directionOnScreen(axis.angle)
  const across = left(d)
  const reaches = [bands[0].from, bands[BANDS - 1].to].map((v) => SIDE[id] * v * frame.view.scale)
  const far = reachOf({ ...axis, beyond: BEYOND }, frame)
  const base = baseOf(centre, d, reaches, far, frame.viewport)
  const inward = base > 0 ? -1 : 1
  const foot = along(centre, d, base)
  const most = Math.max(...bands.map(({ share }) => share))
  const bars = bands.map(({ from, to, share }) => {
    const [a, b] = [from, to].map((v) => along(foot, across, SIDE[id] * v * frame.view.scale))
    const length = (LONGEST * share) / most
    return `${moveTo(a)}${lineTo(b)}${lineTo(along(b, d, inward * length))}${lineTo(along(a, d, inward * length))}Z`
  })
  const ends = reaches.map((v) => along(foot, across, v))
  return (
    <g pointerEvents="none">
      <path d={bars.join('')} className="fill-accent" fillOpacity={0.32} />
      <path d={`${moveTo(ends[0])}${lineTo(ends[1])}`} className="stroke-accent" strokeWidth={1} />
    </g>
  )
}
