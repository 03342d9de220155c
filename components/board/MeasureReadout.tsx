'use client'
import { CopyButton } from '@/components/sheet/CopyButton'
import type { Writing } from './annotate'
import { measured } from './measure'
import type { Snapped } from './snapper'
import type { DrawingPoint } from './view'

const KINDS = { end: 'end', middle: 'middle', centre: 'centre', edge: 'edge' }

/** What the measurement says, in words and figures; one line that is always there while measuring. */
export function MeasureReadout({
  points,
  pointer,
  writing,
}: {
  points: DrawingPoint[]
  pointer: Snapped | null
  writing: Writing
}) {
  const ends = points.length === 2 ? points : points.length === 1 && pointer ? [points[0], pointer.at] : null
  const result = ends && measured(ends[0], ends[1])
  const radius = pointer?.radius
  const parts = result
    ? [
        ['distance', writing.length(result.distance)],
        ['Δx', writing.length(result.dx)],
        ['Δy', writing.length(result.dy)],
        ...(result.angle === null ? [] : [['angle', writing.angle(result.angle)]]),
      ]
    : []
  const arc = radius
    ? [
        ['radius', writing.length(radius)],
        ['diameter', writing.length(2 * radius)],
      ]
    : []
  const plain = result && [result.distance, result.dx, result.dy, result.angle ?? ''].join('\t')
  return (
    <div className="flex flex-wrap items-center gap-x-4 text-small" aria-live="polite">
      {parts.length + arc.length === 0 && (
        <span className="text-soft">Choose two points. Arrow keys move the pointer, Enter takes the point, Escape ends.</span>
      )}
      {[...parts, ...arc].map(([word, value]) => (
        <span key={word} className="whitespace-nowrap">
          <span className="text-soft">{word}</span> <span className="font-mono">{value}</span>
        </span>
      ))}
      {pointer?.kind && <span className="text-soft">at {KINDS[pointer.kind]}</span>}
      {plain && points.length === 2 && <CopyButton text={plain} name="Copy distance, Δx, Δy and angle in mm and degrees" />}
    </div>
  )
}
