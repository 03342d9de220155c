import { boundsOfEdges, unionOfBoxes } from '../bounds'
import { visitBoxPairs } from '../boxPairs'
import { type EdgeTable, LINE } from '../edges'
import { jetAt, lengthOf, newJet } from '../evaluate'
import type { Finding } from '../finding'
import { nearestOn } from '../nearest'
import type { Bond } from '../recipe'
import type { Region } from '../region'
import { isConvex } from './convex'
import { combineFinding } from './findings'
import { perimeterOf } from './regionFrom'

/**
 * Edges that face one another across a void narrower than the limit, those that belong together as one finding. Loops
 * marked `thin` are reported otherwise.
 */
export function facingGaps(
  region: Region,
  thin: Uint8Array,
  area: number[],
  bonds: Bond[],
  limit: number,
  mmPerUnit: number,
): Finding[] {
  const { edges, loopStart, piece } = region
  const boxes = boundsOfEdges(edges)
  const loops = suspects(region, thin, area, boxes, limit)
  if (loops.length === 0) return []
  const rows: number[] = []
  const loopOf: number[] = []
  for (const k of loops) {
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) {
      rows.push(i)
      loopOf.push(k)
    }
  }
  const own = new Float64Array(4 * rows.length)
  rows.forEach((i, n) => {
    own.set(boxes.subarray(4 * i, 4 * i + 4), 4 * n)
  })
  const parent = new Map<number, number>()
  const find = (i: number): number => {
    const up = parent.get(i) ?? i
    return up === i ? i : find(up)
  }
  const places: Place[] = []
  visitBoxPairs(own, rows.length, limit / 2, (m, n) => {
    if (joined(edges, rows[m], rows[n])) return true
    const place = across(edges, rows[m], rows[n], limit)
    if (!place) return true
    const [a, b] = [find(m), find(n)].sort((p, q) => p - q)
    parent.set(b, a)
    places.push({ ...place, edge: m, apart: piece[loopOf[m]] !== piece[loopOf[n]] })
    return true
  })
  const groups = new Map<number, Place>()
  for (const place of places) {
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

/**
 * Loops that can have a narrow void beside them: those that are not convex and wide, and those whose box comes near
 * the box of one they have void in common with.
 */
function suspects(region: Region, thin: Uint8Array, area: number[], edgeBoxes: Float64Array, limit: number): number[] {
  const { edges, loopStart, hole, piece } = region
  const count = hole.length
  const suspect = new Uint8Array(count)
  const boxes = new Float64Array(4 * count)
  for (let k = 0; k < count; k++) {
    boxes.set(unionOfBoxes(edgeBoxes, loopStart[k], loopStart[k + 1]), 4 * k)
    const plain = isConvex(edges, loopStart[k], loopStart[k + 1], hole[k] ? -1 : 1)
    if (!plain || (hole[k] && -area[k] < 4 * limit * perimeterOf(region, k))) suspect[k] = 1
  }
  visitBoxPairs(boxes, count, limit / 2, (a, b) => {
    const metalBetween = (hole[a] && hole[b]) || (piece[a] === piece[b] && (hole[a] || hole[b]))
    if (!metalBetween) suspect[a] = suspect[b] = 1
    return true
  })
  return Array.from(suspect.keys()).filter((k) => suspect[k] && !thin[k])
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
