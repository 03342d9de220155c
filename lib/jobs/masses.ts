import type { RegionAnswer } from '../geometry/arrangement/regionOf'
import type { Finding } from '../geometry/finding'
import type { Region } from '../geometry/region'
import type { SectionInputs } from '../section/section'
import type { UsedMaterial } from './answer'
import { taskFinding } from './findings'

/**
 * Densities for the mass: of the whole where one material fills it, else of each material's own region. A material of the
 * make-up counts before the recipe's; one that is not known gives no mass but a finding.
 */
export function massesOf(
  parts: RegionAnswer['parts'],
  recipeMaterial: string | null,
  materials: Record<string, UsedMaterial>,
  placed: (region: Region) => Region,
): { masses: Pick<SectionInputs, 'density' | 'parts'>; findings: Finding[] } {
  const named = parts.map(({ material }) => material ?? recipeMaterial)
  const unknown = [...new Set(named)].filter((id) => id !== null && !(id in materials))
  const findings = unknown.map((material) => taskFinding('material-unknown', { material }))
  const densities = named.map((id) => (id === null ? undefined : materials[id]?.density))
  if (densities.length === 0 || densities.includes(undefined)) return { masses: {}, findings }
  if (new Set(densities).size === 1) return { masses: { density: densities[0] }, findings }
  const each = parts.map(({ region }, k) => ({ region: placed(region), density: densities[k] ?? 0 }))
  return { masses: { parts: each }, findings }
}
