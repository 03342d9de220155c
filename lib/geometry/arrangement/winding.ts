import Flatbush from 'flatbush'
import { chainWalk } from './chains'
import type { Merged } from './merge'
import type { Pieces } from './monotone'
import { crossingOf, pointOf } from './stretch'
import type { Vertices } from './vertices'

/** Where along a sub-edge its ray starts; the later ones only when an earlier one runs too near another edge. */
const FRACTIONS = [0.5, 0.31, 0.69, 0.17, 0.83, 0.07, 0.93]
/** A start is clear when nothing else lies within this many tolerances of it along the ray. */
const CLEAR = 4

const p = new Float64Array(2)

/**
 * Which owners hold the points left and right of each sub-edge. A ray along an axis (the one the sub-edge
 * crosses more steeply, towards the nearer side of the drawing) from a point of the sub-edge sums the
 * signed counts of what it crosses, by the half-open rule on snapped vertices, so that nothing leaks.
 */
export function windings(
  pieces: Pieces,
  local: Vertices,
  merged: Merged,
  owners: number,
): { left: Uint32Array; right: Uint32Array; sets: Uint32Array[] } {
  const { count, from, to, countStart, countOwner, countValue } = merged
  const left = new Uint32Array(count)
  const right = new Uint32Array(count)
  const { sets, idOf } = interned()
  const rows: number[] = []
  for (let u = 0; u < count; u++) if (countStart[u + 1] > countStart[u]) rows.push(u)
  if (rows.length === 0) return { left, right, sets }
  const coordinate = [local.x, local.y]
  const stretches = { pieces, local, merged }
  const index = new Flatbush(rows.length)
  for (const u of rows) {
    const [x0, y0, x1, y1] = [local.x[from[u]], local.y[from[u]], local.x[to[u]], local.y[to[u]]]
    index.add(Math.min(x0, x1), Math.min(y0, y1), Math.max(x0, x1), Math.max(y0, y1))
  }
  index.finish()
  const reach = CLEAR * local.tolerance
  const winding = new Int32Array(owners)
  const best = new Int32Array(owners)
  const stamp = new Uint32Array(owners)
  let rays = 0
  let touched: number[] = []
  let clearance = 0

  /** Sums into `winding` what the ray from M along ±axis crosses; sets `clearance`. */
  const shoot = (u: number, axis: 0 | 1, ahead: boolean, mx: number, my: number) => {
    const [along, across] = [coordinate[axis], coordinate[1 - axis]]
    const m = axis === 0 ? mx : my
    const level = axis === 0 ? my : mx
    clearance = Number.POSITIVE_INFINITY
    rays++
    const visit = (k: number) => {
      const s = rows[k]
      if (s === u) return false
      const a = across[from[s]]
      const b = across[to[s]]
      if (a <= level === b <= level) return false
      const low = Math.min(along[from[s]], along[to[s]])
      const high = Math.max(along[from[s]], along[to[s]])
      let beyond = ahead ? low > m + reach : high < m - reach
      if (!beyond) {
        if (ahead ? high < m - reach : low > m + reach) return false
        const at = crossingOf(stretches, s, axis, level)
        clearance = Math.min(clearance, Math.abs(at - m))
        beyond = ahead ? at > m : at < m
      }
      if (!beyond) return false
      const turns = (b > a ? 1 : -1) * (axis === 0 ? 1 : -1) * (ahead ? 1 : -1)
      for (let c = countStart[s]; c < countStart[s + 1]; c++) {
        if (stamp[countOwner[c]] !== rays) {
          stamp[countOwner[c]] = rays
          touched.push(countOwner[c])
        }
        winding[countOwner[c]] += turns * countValue[c]
      }
      return false
    }
    const far = ahead ? Number.POSITIVE_INFINITY : Number.NEGATIVE_INFINITY
    const [a, b] = ahead ? [m - reach, far] : [far, m + reach]
    if (axis === 0) index.search(a, my, b, my, visit)
    else index.search(mx, a, mx, b, visit)
  }

  const walk = chainWalk(merged, rows, local.count)
  const done = new Uint8Array(count)
  for (const u of rows) {
    if (done[u]) continue
    const [x0, y0, x1, y1] = [local.x[from[u]], local.y[from[u]], local.x[to[u]], local.y[to[u]]]
    const { axis, ahead } = rayFrom(index, x0, y0, x1, y1)
    let clearest = -1
    let bestTouched: number[] = []
    for (const fraction of FRACTIONS) {
      touched = []
      pointOf(stretches, u, fraction, p)
      shoot(u, axis, ahead, p[0], p[1])
      if (clearance > clearest) {
        for (const o of bestTouched) best[o] = 0
        clearest = clearance
        bestTouched = touched
        for (const o of touched) best[o] = winding[o]
      }
      for (const o of touched) winding[o] = 0
      if (clearest > reach) break
    }
    const forward = (axis === 0 ? y1 > y0 : x1 < x0) === ahead
    const near = idOf(bestTouched, best)
    for (let c = countStart[u]; c < countStart[u + 1]; c++) {
      if (!bestTouched.includes(countOwner[c])) bestTouched.push(countOwner[c])
      best[countOwner[c]] += forward ? countValue[c] : -countValue[c]
    }
    const far = idOf(bestTouched, best)
    for (const o of bestTouched) best[o] = 0
    left[u] = forward ? far : near
    right[u] = forward ? near : far
    walk(u, (w, turned) => {
      done[w] = 1
      left[w] = turned ? right[u] : left[u]
      right[w] = turned ? left[u] : right[u]
    })
  }
  return { left, right, sets }
}

/** Sets of owners, each once; the empty set is number 0. */
function interned() {
  const sets: Uint32Array[] = [new Uint32Array(0)]
  const ids = new Map<string, number>([['', 0]])
  const idOf = (touched: number[], winding: Int32Array): number => {
    const held = touched.filter((o) => winding[o] !== 0)
    if (held.length > 1) held.sort((a, b) => a - b)
    const key = held.join(',')
    let id = ids.get(key)
    if (id === undefined) {
      id = sets.length
      ids.set(key, id)
      sets.push(Uint32Array.from(held))
    }
    return id
  }
  return { sets, idOf }
}

/** A sub-edge may be crossed by a ray at this sine of the angle between them or more, when that makes the ray shorter. */
const STEEP = 0.3

/** The axis and direction of the ray: the shorter way out of the drawing of those that cross the sub-edge steeply. */
function rayFrom(box: Flatbush, x0: number, y0: number, x1: number, y1: number): { axis: 0 | 1; ahead: boolean } {
  const [x, y] = [(x0 + x1) / 2, (y0 + y1) / 2]
  const [dx, dy] = [Math.abs(x1 - x0), Math.abs(y1 - y0)]
  const out = [Math.min(box.maxX - x, x - box.minX), Math.min(box.maxY - y, y - box.minY)]
  const both = Math.min(dx, dy) > STEEP * Math.hypot(dx, dy)
  const axis = (both ? out[0] <= out[1] : dy >= dx) ? 0 : 1
  return { axis, ahead: axis === 0 ? box.maxX - x <= x - box.minX : box.maxY - y <= y - box.minY }
}
