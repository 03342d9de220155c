import type { Finding } from '../geometry/finding'
import { geometryFinding } from '../geometry/findings'
import type { Repair } from '../geometry/region'
import type { Section } from '../section/types'

/**
 * Findings of closed gaps with what another reasonable closing would change in the section: ΔA with the sign it has there
 * (an outline that cuts turns it round), and ΔIx, ΔIy about the section's centroid to first order. `drawn` are the repairs
 * of the outlines taken where they were drawn, `placed` the same in the section's frame, mm.
 */
export function withGapMoments(findings: Finding[], drawn: Repair[], placed: Repair[], section: Section | null): Finding[] {
  if (!section || drawn.length === 0) return findings
  const { x, y } = section.centroid
  const at = new Map(drawn.map((repair, n) => [`${repair.x},${repair.y}`, placed[n]]))
  return findings.map((finding) => {
    const repair = finding.code === 'gap-closed' ? at.get(`${finding.params.x},${finding.params.y}`) : undefined
    if (!repair || repair.area === 0) return finding
    const params = { area: repair.area, dIx: repair.area * (repair.y - y) ** 2, dIy: repair.area * (repair.x - x) ** 2 }
    return geometryFinding('gap-closed', { ...finding.params, ...params }, finding.at, finding.size)
  })
}
