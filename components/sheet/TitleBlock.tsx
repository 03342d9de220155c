import type { ReactNode } from 'react'
import { classes } from '@/components/ui/classes'
import type { Revision } from '@/lib/api/schemas/revision'

function Cell({ name, children, title, wide }: { name: string; children: ReactNode; title?: string; wide?: boolean }) {
  return (
    <div
      className={classes('-ml-px min-w-0 border-line border-l px-3 py-1', wide && 'max-sm:col-span-2 max-sm:border-b')}
      title={title}
    >
      <dt className="text-soft text-tiny">{name}</dt>
      <dd className="truncate text-small">{children}</dd>
    </div>
  )
}

const CONFIRMED = { typed: 'by a known dimension', drawn: 'by a drawn dimension' }

/** The title block, as ISO 7200 lists it: unit and who confirmed it, material, file, engine. */
export function TitleBlock({ revision }: { revision: Revision }) {
  const { answer, confirmation, material, file, createdBy } = revision
  const unit = answer.unit.drawing === String(answer.unit.mmPerUnit) ? `${answer.unit.mmPerUnit} mm` : answer.unit.drawing
  const how = confirmation ? `${confirmation.what}, ${CONFIRMED[confirmation.by]}` : 'Nobody has confirmed the size yet'
  return (
    <dl className="grid grid-cols-2 border-hair border-t sm:grid-cols-[2fr_1fr_1fr_auto]">
      <Cell name="Drawn in" title={how} wide>
        {unit}, {confirmation ? `confirmed by ${createdBy.name}` : <b className="font-semibold text-ochre">size not confirmed</b>}
      </Cell>
      <Cell name="Material" title={material ? `${material.density} kg/m³, ${material.source}` : undefined}>
        {material?.name ?? 'none'}
      </Cell>
      <Cell name="File" title={`${file.name}, SHA-256 ${file.sha256}`}>
        <span className="font-mono">
          {file.sha256.slice(0, 4)}…{file.sha256.slice(-4)}
        </span>
      </Cell>
      <Cell name="Engine">
        <span className="font-mono">{answer.engineVersion}</span>
      </Cell>
    </dl>
  )
}
