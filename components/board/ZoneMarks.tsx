import type { View, Viewport } from './view'
import { type Sheet, zoneMarks } from './zones'

/** Names and borders of the sheet's zones along the edges of the board. */
export function ZoneMarks({ sheet, view, viewport }: { sheet: Sheet; view: View; viewport: Viewport }) {
  const { columns, rows } = zoneMarks(sheet, view, viewport)
  const borders = [
    ...columns.flatMap(({ end }) => (end === null ? [] : [`M${end} 0v9`, `M${end} ${viewport.height}v-9`])),
    ...rows.flatMap(({ end }) => (end === null ? [] : [`M0 ${end}h9`, `M${viewport.width} ${end}h-9`])),
  ]
  return (
    <g>
      <path d={borders.join('')} className="fill-none stroke-edge" strokeWidth={1} />
      <g className="fill-soft stroke-sheet font-mono" fontSize={11} textAnchor="middle" strokeWidth={3} paintOrder="stroke">
        {columns.map(
          ({ text, at }) =>
            at !== null && (
              <text key={text} x={at} y={15}>
                {text}
              </text>
            ),
        )}
        {rows.map(
          ({ text, at }) =>
            at !== null && (
              <text key={text} x={11} y={at + 4}>
                {text}
              </text>
            ),
        )}
      </g>
    </g>
  )
}
