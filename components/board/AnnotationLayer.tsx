import type { Annotations, LineLook, TextLabel, TextLook } from './annotation'

const LINES: Record<LineLook, { className: string; width: number; dash?: string }> = {
  centroid: { className: 'stroke-soft', width: 1, dash: '16 3 2 3' },
  principal: { className: 'stroke-accent', width: 1.4, dash: '16 3 2 3' },
  plastic: { className: 'stroke-soft', width: 1, dash: '7 5' },
  dimension: { className: 'stroke-soft', width: 1 },
  fibre: { className: 'stroke-accent', width: 1.4 },
  circle: { className: 'stroke-soft', width: 1, dash: '2 4' },
  angle: { className: 'stroke-accent', width: 1 },
  user: { className: 'stroke-accent', width: 1.6, dash: '10 4' },
  hot: { className: 'stroke-accent', width: 2.4 },
}
const FILLS: Record<LineLook, string> = {
  centroid: 'fill-soft',
  principal: 'fill-accent',
  plastic: 'fill-soft',
  dimension: 'fill-soft',
  fibre: 'fill-accent',
  circle: 'fill-soft',
  angle: 'fill-accent',
  user: 'fill-accent',
  hot: 'fill-accent',
}
const TEXTS: Record<TextLook, string> = {
  axis: 'fill-soft font-semibold',
  principal: 'fill-accent font-semibold',
  dimension: 'fill-ink',
  plastic: 'fill-soft',
  user: 'fill-accent font-semibold',
}

function Text({ label, choice }: { label: TextLabel; choice: number }) {
  const at = label.places[choice] ?? label.places[0]
  const turn = label.turned ? `rotate(-90 ${at.x} ${at.y})` : undefined
  return (
    <text
      x={at.x}
      y={at.y}
      dy="0.35em"
      transform={turn}
      fontSize={label.size}
      textAnchor="middle"
      strokeWidth={4}
      strokeLinejoin="round"
      paintOrder="stroke"
      className={`stroke-sheet ${label.mono ? 'font-mono' : ''} ${TEXTS[label.look]}`}
    >
      {label.text}
    </text>
  )
}

/** Lines first, then their labels with a clear edge around them. */
export function AnnotationLayer({ annotations, choices }: { annotations: Annotations; choices: Record<string, number> }) {
  return (
    <g pointerEvents="none">
      {annotations.strokes.map(({ id, look, d, mark }) => (
        <path
          key={id}
          d={d}
          className={`${mark === 'filled' ? FILLS[look] : `fill-none ${LINES[look].className}`}`}
          strokeWidth={mark === 'filled' ? undefined : LINES[look].width}
          strokeDasharray={mark ? undefined : LINES[look].dash}
        />
      ))}
      {annotations.labels.map((label) => (
        <Text key={label.id} label={label} choice={choices[label.id] ?? 0} />
      ))}
    </g>
  )
}
