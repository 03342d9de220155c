import { readFileSync } from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { torsionOf } from '@/lib/section/torsion/torsion'
import { hole, outer, regionOfLoops, type Vertex } from '../../support/region'

interface Row {
  id: string
  outline: { role: 'outer' | 'hole'; vertices: Vertex[] }[]
  fe_solution: {
    J_mm4: number
    J_rel_estimate: number
    shear_centre_mm: [number, number]
    Iw_mm6: number
    Iw_rel_estimate: number
  }
}
const { rows }: { rows: Row[] } = JSON.parse(
  readFileSync(path.join(import.meta.dirname, '../../../fixtures/handbook/sections.json'), 'utf8'),
)

// J by FreeFem++ 4.11, second-order triangles on two meshes (fixtures/handbook/README.md); its own estimate × 10 is granted.
test.each(rows.map((row): [string, Row] => [row.id, row]))(
  'J of %s lies between bounds a 500th apart',
  (_id, { outline, fe_solution }) => {
    const region = regionOfLoops(outline.map(({ role, vertices }) => (role === 'hole' ? hole(vertices) : outer(vertices))))
    const torsion = torsionOf(region)
    if (!torsion) throw new Error('no mesh')
    const granted = 10 * fe_solution.J_rel_estimate
    expect(torsion.lower).toBeLessThanOrEqual(fe_solution.J_mm4 * (1 + granted))
    expect(torsion.upper).toBeGreaterThanOrEqual(fe_solution.J_mm4 * (1 - granted))
    expect((torsion.upper - torsion.lower) / torsion.upper).toBeLessThanOrEqual(0.002)
  },
)
