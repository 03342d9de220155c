import type { EdgeTable } from '../edges'
import { jetAt, newJet } from '../evaluate'
import type { Finding } from '../finding'
import type { Tolerances } from '../outlineSet'
import type { Bond } from '../recipe'
import type { Region } from '../region'
import { facingGaps, type Narrow, thinWalls } from './facing'
import { combineFinding } from './findings'
import { perimeterOf } from './regionFrom'

/** Gaps and walls narrower than this are asked about, mm. */
const NARROW = 0.05

/** Slivers (2A ÷ perimeter below the duplicate tolerance), and slits, gaps and thin walls between facing edges. */
export function narrowPlaces(
  region: Region,
  area: number[],
  bonds: Bond[],
  tolerances: Tolerances,
  mmPerUnit: number,
): { findings: Finding[]; narrow: Narrow[] } {
  const { findings, thin } = slivers(region, area, tolerances.duplicate, mmPerUnit)
  const limit = NARROW / mmPerUnit
  const gaps = facingGaps(region, thin, area, bonds, limit, mmPerUnit)
  const narrow = [...gaps, ...thinWalls(region, thin, bonds, limit, mmPerUnit)]
  return { findings: [...findings, ...narrow.map(({ finding }) => finding)], narrow }
}

function slivers(region: Region, area: number[], duplicate: number, mmPerUnit: number) {
  const { edges, loopStart, hole, piece, pieces } = region
  const thin = new Uint8Array(hole.length)
  const findings: Finding[] = []
  const net = new Float64Array(pieces)
  area.forEach((a, k) => {
    net[piece[k]] += a
  })
  const holes: number[][] = Array.from({ length: pieces }, () => [])
  for (let k = 0; k < hole.length; k++) if (hole[k]) holes[piece[k]].push(k)
  for (let k = 0; k < hole.length; k++) {
    const size = hole[k] ? -area[k] : net[piece[k]]
    const i = loopStart[k]
    const wide = extent(edges, i, loopStart[k + 1])
    if (size > 1000 * duplicate * wide) continue
    let perimeter = perimeterOf(region, k)
    if (!hole[k]) for (const h of holes[piece[k]]) perimeter += perimeterOf(region, h)
    const width = (2 * size) / perimeter
    if (width >= duplicate) continue
    thin[k] = 1
    const { x, y } = jetAt(edges, i, 0.5, newJet())
    const params = { area: size * mmPerUnit * mmPerUnit, width: width * mmPerUnit, x, y }
    findings.push(combineFinding(hole[k] ? 'sliver-void' : 'sliver', params, [x, y], wide))
  }
  return { findings, thin }
}

function extent({ ends }: EdgeTable, from: number, to: number): number {
  let size = 0
  for (let i = from; i < to; i++) {
    size = Math.max(size, Math.abs(ends[4 * i] - ends[4 * from]), Math.abs(ends[4 * i + 1] - ends[4 * from + 1]))
    size = Math.max(size, Math.abs(ends[4 * i + 2] - ends[4 * i]), Math.abs(ends[4 * i + 3] - ends[4 * i + 1]))
  }
  return size
}
