'use client'
import { useState } from 'react'
import { ExportMenu } from '@/components/lists/ExportMenu'
import { useLocalSort } from '@/components/lists/useLocalSort'
import { useMay } from '@/components/shell/Me'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { Field } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { type Column, Table } from '@/components/ui/Table'
import { useForm } from '@/components/ui/useForm'
import type { Material } from '@/lib/api/schemas/people'
import { saveMaterial, useMaterials } from './materials'

/** The materials that give profiles their mass, each with the source of its density. */
export function MaterialsTable() {
  const { data: materials = [] } = useMaterials()
  const may = useMay('material.edit')
  const [opened, setOpened] = useState<Material | 'new' | null>(null)
  const columns: Column<Material>[] = [
    { key: 'name', head: 'Material', sort: 'name', plain: ({ name }) => name, cell: ({ name }) => name },
    {
      key: 'density',
      head: 'Density',
      sort: 'density',
      plainHead: 'Density [kg/m³]',
      plain: ({ density }) => density,
      figure: true,
      cell: ({ density }) => (
        <>
          {density} <span className="font-sans text-soft">kg/m³</span>
        </>
      ),
    },
    {
      key: 'source',
      head: 'Source',
      sort: 'source',
      plain: ({ source }) => source,
      wide: true,
      cell: ({ source }) => <span className="text-soft">{source}</span>,
    },
  ]
  if (may) {
    columns.push({
      key: 'do',
      head: <span className="sr-only">Actions</span>,
      cell: (material) => (
        <div className="flex justify-end">
          <Button look="quiet" aria-label={`Change ${material.name}`} onClick={() => setOpened(material)}>
            Change
          </Button>
        </div>
      ),
    })
  }
  const sorted = useLocalSort('materials', materials, columns)
  return (
    <section aria-labelledby="materials" className="border-t border-hair py-4">
      <div className="flex items-center justify-between gap-4">
        <h2 id="materials" className="font-semibold text-lg">
          Materials
        </h2>
        <div className="flex gap-2">
          <ExportMenu name="materials" columns={columns} align="right" all={async () => materials} />
          {may && <Button onClick={() => setOpened('new')}>Add a material</Button>}
        </div>
      </div>
      <Table caption="Materials" columns={columns} {...sorted} rowKey={({ id }) => id} />
      <p className="mt-2 text-small text-soft">
        A saved revision keeps the density it was computed with; a change here alters no stored section.
      </p>
      <Dialog
        title={opened === 'new' ? 'Add a material' : (opened?.name ?? '')}
        open={opened !== null}
        onClose={() => setOpened(null)}
      >
        {opened && <MaterialForm material={opened === 'new' ? undefined : opened} onDone={() => setOpened(null)} />}
      </Dialog>
    </section>
  )
}

function MaterialForm({ material, onDone }: { material?: Material; onDone: () => void }) {
  const { form, text, submit, busy, problem } = useForm({
    name: material?.name ?? '',
    density: material ? String(material.density) : '',
    source: material?.source ?? '',
  })
  const save = submit(async ({ name, density, source }) => {
    await saveMaterial({ name, source, density: Number(density.trim().replace(',', '.')) }, material)
    onDone()
  })
  return (
    <form ref={form} className="grid gap-4" onSubmit={save}>
      <Field {...text('name')} label="Name" required maxLength={120} autoFocus />
      <Field {...text('density')} label="Density" unit="kg/m³" inputMode="decimal" required />
      <Field {...text('source')} label="Source" maxLength={200} hint="Where the density is from: a standard, a data sheet." />
      <ProblemNotice problem={problem} />
      <div>
        <Button type="submit" look="main" disabled={busy}>
          Save
        </Button>
      </div>
    </form>
  )
}
