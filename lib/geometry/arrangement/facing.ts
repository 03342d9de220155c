import { boundsOfEdges, boundsOfLoops } from '../bounds'
import { visitBoxPairs } from '../boxPairs'
import type { EdgeTable } from '../edges'
import type { Finding } from '../finding'
import { mayMeet } from '../mayMeet'
import type { Bond, XY } from '../recipe'
import type { Region } from '../region'
import { type Across, across, type Between } from './across'
import { isConvex } from './convex'
import { combineFinding } from './findings'
import { perimeterOf } from './regionFrom'

/** A narrow place, and what would be added or cut to have it the other way. */
export interface Narrow {
  finding: Finding
  patches: XY[][]
  does: 'add' | 'cut'
  /** whether a person has answered that it is the other way */
  isTaken: boolean
}

/** Slits and gaps narrower than the limit. Loops marked `thin` are reported otherwise. */
export function facingGaps(
  region: Region,
  thin: Uint8Array,
  area: number[],
  bonds: Bond[],
  limit: number,
  mmPerUnit: number,
): Narrow[] {
  const boxes = boundsOfEdges(region.edges)
  const loops = suspects(region, thin, area, boxes, limit)
  return facingPlaces(region, loops, boxes, limit, 'void').map(({ gap, length, at, apart, patches }) => {
    const params = { gap: gap * mmPerUnit, length: length * mmPerUnit, x: at[0], y: at[1] }
    const is = answerAt(bonds, at, Math.max(limit, length))
    const finding = is
      ? combineFinding('gap-answered', { ...params, is }, at, length)
      : combineFinding(apart ? 'gap' : 'slit', params, at, length)
    return { finding, patches, does: 'add', isTaken: is === 'bonded' || is === 'metal' }
  })
}

/** Above this no torsion is sought (lib/section), and nothing else hangs on a wall a few µm thick. */
const MOST_EDGES = 5000

/** Metal thinner than the limit between edges of loops that are not `thin` themselves. */
export function thinWalls(region: Region, thin: Uint8Array, bonds: Bond[], limit: number, mmPerUnit: number): Narrow[] {
  if (region.edges.count > MOST_EDGES) return []
  const loops = Array.from(thin.keys()).filter((k) => !thin[k])
  return facingPlaces(region, loops, boundsOfEdges(region.edges), limit, 'metal').map(({ gap, length, at, patches }) => {
    const params = { width: gap * mmPerUnit, length: length * mmPerUnit, x: at[0], y: at[1] }
    const is = answerAt(bonds, at, Math.max(limit, length))
    const finding = is
      ? combineFinding('wall-answered', { ...params, is }, at, length)
      : combineFinding('wall-thin', params, at, length)
    return { finding, patches, does: 'cut', isTaken: is === 'void' }
  })
}

const answerAt = (bonds: Bond[], [x, y]: XY, reach: number): Bond['is'] | undefined =>
  bonds.find(({ at }) => Math.hypot(at[0] - x, at[1] - y) <= reach)?.is

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
  for (let n = 0; n < rows.length; n++) for (let c = 0; c < 4; c++) own[4 * n + c] = boxes[4 * rows[n] + c]
  const parent = new Map<number, number>()
  const find = (i: number): number => {
    const up = parent.get(i) ?? i
    return up === i ? i : find(up)
  }
  const places: Place[] = []
  visitBoxPairs(own, rows.length, limit / 2, (m, n) => {
    if (joined(edges, rows[m], rows[n]) || !mayMeet(edges, rows[m], rows[n], limit)) return true
    const place = across(edges, rows[m], rows[n], limit, between)
    if (!place) return true
    const [a, b] = [find(m), find(n)].sort((p, q) => p - q)
    parent.set(b, a)
    places.push({ ...place, patches: [place.patch], edge: m, apart: piece[loopOf[m]] !== piece[loopOf[n]] })
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
        patches: [...group.patches, ...place.patches],
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
  const boxes = boundsOfLoops(edgeBoxes, loopStart)
  for (let k = 0; k < count; k++) {
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
  patches: XY[][]
  edge: number
  apart: boolean
}

function joined({ ends }: EdgeTable, i: number, j: number): boolean {
  for (let a = 4 * i; a < 4 * i + 4; a += 2) {
    for (let b = 4 * j; b < 4 * j + 4; b += 2) if (ends[a] === ends[b] && ends[a + 1] === ends[b + 1]) return true
  }
  return false
}
