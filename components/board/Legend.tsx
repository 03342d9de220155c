import type { ReactNode } from 'react'
import type { Shown } from './annotate'
import { centroidMark, shearCentreMark } from './marks'
import type { AxisNames } from '@/lib/section/naming'
import type { BoardModel } from './model'

function Row({ sample, children }: { sample: ReactNode; children: ReactNode }) {
  return (
    <li className="flex items-center gap-2 whitespace-nowrap">
      <svg width="34" height="12" viewBox="0 0 34 12" aria-hidden="true">
        {sample}
      </svg>
      {children}
    </li>
  )
}
const line = (className: string, width: number, dash?: string) => (
  <path d="M0 6H34" className={`fill-none ${className}`} strokeWidth={width} strokeDasharray={dash} />
)

/** What the lines on the board mean; only what is drawn now. */
export function Legend({ model, shown, names }: { model: BoardModel; shown: Shown; names: AxisNames }) {
  const { section } = model
  const mark = centroidMark(5)
  const looks = new Set(model.strokes.map(({ look }) => look))
  return (
    <ul className="flex flex-wrap gap-x-5 gap-y-1 text-tiny text-soft" aria-label="Legend">
      {section && (
        <Row
          sample={
            <g transform="translate(17 6)">
              <path d={mark.circle} className="fill-sheet stroke-ink" strokeWidth={1} />
              <path d={mark.quarters} className="fill-ink" />
            </g>
          }
        >
          centroid
        </Row>
      )}
      {section?.shearCentre && shown.axes && (
        <Row
          sample={<path d={shearCentreMark(2.5)} transform="translate(17 6)" className="fill-none stroke-ink" strokeWidth={1} />}
        >
          shear centre
        </Row>
      )}
      {section && shown.axes && <Row sample={line('stroke-soft', 1, '12 3 2 3')}>{`centroid axes ${names.x}, ${names.y}`}</Row>}
      {section && shown.axes && section.theta !== null && (
        <Row sample={line('stroke-accent', 1.4, '12 3 2 3')}>{`principal axes ${names.axis1}, ${names.axis2}`}</Row>
      )}
      {section && shown.plastic && <Row sample={line('stroke-soft', 1, '6 4')}>plastic neutral axes</Row>}
      {section && shown.circle && <Row sample={line('stroke-soft', 1, '2 4')}>circumscribing circle</Row>}
      {looks.has('open') && <Row sample={line('stroke-brick', 1.6)}>does not close</Row>}
      {looks.has('out') && <Row sample={line('stroke-hair', 1.2)}>left out</Row>}
      {model.marks.length > 0 && (
        <Row sample={<circle cx="17" cy="6" r="5" className="fill-none stroke-ochre" strokeWidth={1.6} />}>finding</Row>
      )}
    </ul>
  )
}
