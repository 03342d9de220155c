import { boundsOfEdges } from '../bounds'
import { visitBoxPairs } from '../boxPairs'
import { type EdgeTable, LINE } from '../edges'
import { jetAt, lengthOf, newJet } from '../evaluate'
import type { Finding } from '../finding'
import { nearestOn } from '../nearest'
import type { Tolerances } from '../outlineSet'
import type { Bond } from '../recipe'
import type { Region } from '../region'
import { combineFinding } from './findings'
import { perimeterOf } from './regionFrom'

/** Gaps narrower than this are asked about, mm. */
const NARROW = 0.05

/** Slivers (2A ÷ perimeter below the duplicate tolerance), and slits and gaps between facing edges. */
export function narrowPlaces(
  region: Region,
  area: number[],
  bonds: Bond[],
  tolerances: Tolerances,
  mmPerUnit: number,
): Finding[] {
  const { findings, thin } = slivers(region, area, tolerances.duplicate, mmPerUnit)
  return [...findings, ...facing(region, thin, bonds, NARROW / mmPerUnit, mmPerUnit)]
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

/** Edges that face one another across a void narrower than the limit, those that belong together as one finding. */
function facing(region: Region, thin: Uint8Array, bonds: Bond[], limit: number, mmPerUnit: number): Finding[] {
  const { edges, loopStart, piece } = region
  const loopOf = new Uint32Array(edges.count)
  for (let k = 0; k < thin.length; k++) loopOf.fill(k, loopStart[k], loopStart[k + 1])
  const parent = new Map<number, number>()
  const find = (i: number): number => {
    const up = parent.get(i) ?? i
    return up === i ? i : find(up)
  }
  const places = new Map<number, Place>()
  visitBoxPairs(boundsOfEdges(edges), edges.count, limit / 2, (i, j) => {
    if (thin[loopOf[i]] || thin[loopOf[j]] || joined(edges, i, j)) return true
    const place = across(edges, i, j, limit)
    if (!place) return true
    const [a, b] = [find(i), find(j)].sort((p, q) => p - q)
    parent.set(b, a)
    places.set(places.size, { ...place, edge: i, apart: piece[loopOf[i]] !== piece[loopOf[j]] })
    return true
  })
  const groups = new Map<number, Place>()
  for (const place of places.values()) {
    const root = find(place.edge)
    const group = groups.get(root)
    if (!group) groups.set(root, place)
    else
      groups.set(root, {
        ...(place.length > group.length ? place : group),
        gap: Math.min(group.gap, place.gap),
        length: group.length + place.length,
      })
  }
  return [...groups.values()]
    .filter(({ length, gap }) => length > 4 * gap)
    .map((place) => gapFinding(place, bonds, limit, mmPerUnit))
}

interface Across {
  gap: number
  length: number
  at: [number, number]
}
interface Place extends Across {
  edge: number
  apart: boolean
}

function gapFinding({ gap, length, at, apart }: Place, bonds: Bond[], limit: number, mmPerUnit: number): Finding {
  const params = { gap: gap * mmPerUnit, length: length * mmPerUnit, x: at[0], y: at[1] }
  const bond = bonds.find((b) => Math.hypot(b.at[0] - at[0], b.at[1] - at[1]) <= Math.max(limit, length))
  if (bond) return combineFinding('gap-answered', { ...params, is: bond.is }, at, length)
  return combineFinding(apart ? 'gap' : 'slit', params, at, length)
}

function joined({ ends }: EdgeTable, i: number, j: number): boolean {
  for (const a of [4 * i, 4 * i + 2]) {
    for (const b of [4 * j, 4 * j + 2]) if (ends[a] === ends[b] && ends[a + 1] === ends[b + 1]) return true
  }
  return false
}

const jet = newJet()
const SAMPLES = [1 / 6, 0.5, 5 / 6]

/** How far two edges run opposite to each other with void between: metal is on the left of both. */
function across(edges: EdgeTable, i: number, j: number, limit: number): Across | null {
  const e = edges.ends
  if (edges.kind[i] === LINE && edges.kind[j] === LINE) {
    const dot =
      (e[4 * i + 2] - e[4 * i]) * (e[4 * j + 2] - e[4 * j]) + (e[4 * i + 3] - e[4 * i + 1]) * (e[4 * j + 3] - e[4 * j + 1])
    if (dot >= 0) return null
  }
  const [short, other] = lengthOf(edges, i) <= lengthOf(edges, j) ? [i, j] : [j, i]
  let hits = 0
  let gap = limit
  let at: [number, number] = [0, 0]
  for (const t of SAMPLES) {
    const { x, y, dx, dy } = jetAt(edges, short, t, jet)
    const near = nearestOn(edges, other, x, y)
    if (!(near.distance < limit) || near.t <= 0 || near.t >= 1) continue
    const toRight = dx * (near.y - y) - dy * (near.x - x) < 0
    const there = jetAt(edges, other, near.t, jet)
    const dot = dx * there.dx + dy * there.dy
    if (!toRight || dot > -0.9 * Math.hypot(dx, dy) * Math.hypot(there.dx, there.dy)) continue
    hits++
    gap = Math.min(gap, near.distance)
    at = [(x + near.x) / 2, (y + near.y) / 2]
  }
  return hits === 0 ? null : { gap, length: (hits / SAMPLES.length) * lengthOf(edges, short), at }
}
