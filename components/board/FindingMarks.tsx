'use client'
import type { HoverStore } from './hover'
import type { BoardMark } from './model'
import { useHover } from './useHover'
import { markRadius } from './marks'
import { toScreen, type View } from './view'

const TONES = { note: 'stroke-soft', warning: 'stroke-ochre', error: 'stroke-brick' }

function Mark({ mark, view, hover }: { mark: BoardMark; view: View; hover: HoverStore }) {
  const hot = useHover(hover, (hovered) => hovered?.kind === 'finding' && hovered.index === mark.index)
  const at = toScreen(view, mark.at)
  const r = markRadius(mark, view) + (hot ? 4 : 0)
  return (
    <circle cx={at.x} cy={at.y} r={r} className={`fill-none ${TONES[mark.severity]}`} strokeWidth={hot ? 3 : 2}>
      <title>{mark.message}</title>
    </circle>
  )
}

/** Findings that have a place, ringed. */
export function FindingMarks({ marks, view, hover }: { marks: BoardMark[]; view: View; hover: HoverStore }) {
  return (
    <g>
      {marks.map((mark) => (
        <Mark key={mark.index} mark={mark} view={view} hover={hover} />
      ))}
    </g>
  )
}
