import { combineFinding } from '../geometry/arrangement/findings'
import { patched } from '../geometry/arrangement/patched'
import type { RegionAnswer } from '../geometry/arrangement/regionOf'
import { loopArea } from '../geometry/edgeArea'
import type { Finding } from '../geometry/finding'
import type { Tolerances } from '../geometry/outlineSet'
import type { Region } from '../geometry/region'
import { transformRegion } from '../geometry/transform'
import { torsionFigures } from '../section/torsionFigures'

/** Gaps filled and thin walls cut where a person has answered so; metal of several materials stays as drawn. */
export function asAnswered(answer: RegionAnswer, tolerances: Tolerances, mmPerUnit: number): RegionAnswer {
  const [part] = answer.parts
  let { region } = answer
  if (!region || answer.parts.length > 1) return answer
  const findings = [...answer.findings]
  let answered = 0
  for (const does of ['add', 'cut'] as const) {
    const taken = answer.narrow.filter((narrow) => narrow.isTaken && narrow.does === does)
    if (taken.length === 0) continue
    const before: Region = region
    region = patched(
      before,
      taken.flatMap(({ patches }) => patches),
      does,
      tolerances,
    )
    const { at } = taken[0].finding
    if (!region) {
      const unclear = combineFinding('boundary-unclear', { x: at?.[0] ?? null, y: at?.[1] ?? null }, at)
      return { ...answer, region, parts: [], findings: [...findings, unclear] }
    }
    const change = areaOf(region) - areaOf(before)
    answered += change
    findings.push(combineFinding('narrow-changed', { area: Math.abs(change) * mmPerUnit ** 2, does }, at))
  }
  return { ...answer, region, parts: [{ ...part, region }], findings, answered }
}

const areaOf = ({ edges, loopStart, hole }: Region): number =>
  hole.reduce((sum, _, k) => sum + loopArea(edges, loopStart[k], loopStart[k + 1]), 0)

/** Each costs a solution by finite elements. */
const MOST = 2

/** Findings of narrow places that wait for an answer, each with the torsion constant as drawn and the other way. */
export function withConstants(
  { region, parts, narrow }: RegionAnswer,
  tolerances: Tolerances,
  scale: number,
  asDrawn: number | undefined,
): Map<Finding, Finding> {
  const instead = new Map<Finding, Finding>()
  if (!region || parts.length > 1 || asDrawn === undefined) return instead
  for (const { finding, patches, does } of narrow.filter(isOpen).slice(0, MOST)) {
    const other = patched(region, patches, does, tolerances)
    const j = other && torsionFigures(transformRegion(other, { scale })).figures.j
    if (!j || !isOpenCode(finding.code)) continue
    const params = { ...finding.params, j: asDrawn, jOther: j.value }
    instead.set(finding, combineFinding(finding.code, params, finding.at, finding.size))
  }
  return instead
}

const isOpenCode = (code: string): code is 'slit' | 'gap' | 'wall-thin' => ['slit', 'gap', 'wall-thin'].includes(code)
const isOpen = ({ finding }: { finding: Finding }): boolean => isOpenCode(finding.code)
