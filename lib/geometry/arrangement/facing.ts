import { boundsOfEdges, unionOfBoxes } from '../bounds'
import { visitBoxPairs } from '../boxPairs'
import type { EdgeTable } from '../edges'
import type { Finding } from '../finding'
import type { Bond } from '../recipe'
import type { Region } from '../region'
import { type Across, across, type Between } from './across'
import { isConvex } from './convex'
import { combineFinding } from './findings'
import { perimeterOf } from './regionFrom'

/** Slits and gaps narrower than the limit. Loops marked `thin` are reported otherwise. */
export function facingGaps(
  region: Region,
  thin: Uint8Array,
  area: number[],
  bonds: Bond[],
  limit: number,
  mmPerUnit: number,
): Finding[] {
  const boxes = boundsOfEdges(region.edges)
  const loops = suspects(region, thin, area, boxes, limit)
  return facingPlaces(region, loops, boxes, limit, 'void').map((place) => gapFinding(place, bonds, limit, mmPerUnit))
}

/** Above this no torsion is sought (lib/section), and nothing else hangs on a wall a few µm thick. */
const MOST_EDGES = 5000

/** Metal thinner than the limit between edges of loops that are not `thin` themselves. */
export function thinWalls(region: Region, thin: Uint8Array, limit: number, mmPerUnit: number): Finding[] {
  if (region.edges.count > MOST_EDGES) return []
  const loops = Array.from(thin.keys()).filter((k) => !thin[k])
  return facingPlaces(region, loops, boundsOfEdges(region.edges), limit, 'metal').map(({ gap, length, at: [x, y] }) =>
    combineFinding('wall-thin', { width: gap * mmPerUnit, length: length * mmPerUnit, x, y }, [x, y], length),
  )
}

/** Where edges of the loops face one another closer than the limit; those that belong together are one place. */
function facingPlaces(
  { edges, loopStart, piece }: Region,
  loops: number[],
  boxes: Float64Array,
  limit: number,
  between: Between,
): Place[] {
  const rows: number[] = []
  const loopOf: number[] = []
  for (const k of loops) {
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) {
      rows.push(i)
      loopOf.push(k)
    }
  }
  if (rows.length === 0) return []
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
    const place = across(edges, rows[m], rows[n], limit, between)
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
  return [...groups.values()].filter(({ length, gap }) => length > 4 * gap)
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
