import type { Finding } from '../finding'
import { insideLoop } from '../inside'
import { interiorPoint } from '../interiorPoint'
import type { OutlineSet } from '../outlineSet'
import type { Bond } from '../recipe'
import { thinCells } from './cells'
import { type Combined, loopsWhere } from './combine'
import { combineFinding } from './findings'

/** Outlines that share edges with metal on both sides: united without anybody having said so. */
export function abutting({ tangled }: Combined, mmPerUnit: number): Finding[] {
  const outlines = new Set<number>()
  let length = 0
  let at: [number, number] | null = null
  for (const { tangle, fillings } of tangled) {
    const a = tangle.arrangement
    for (let u = 0; u < a.count; u++) {
      const shared = a.countStart[u + 1] - a.countStart[u] > 1
      if (!shared || fillings[a.left[u]].label === 0 || fillings[a.right[u]].label === 0) continue
      for (let c = a.countStart[u]; c < a.countStart[u + 1]; c++) outlines.add(tangle.members[a.countOwner[c]])
      const [p, q] = [a.from[u], a.to[u]]
      length += Math.hypot(a.x[q] - a.x[p], a.y[q] - a.y[p])
      at ??= [(a.x[p] + a.x[q]) / 2, (a.y[p] + a.y[q]) / 2]
    }
  }
  if (!at) return []
  return [combineFinding('outlines-abut', { count: outlines.size, length: length * mmPerUnit, x: at[0], y: at[1] }, at, length)]
}

/** Where two materials claim the same place; a bond inside the overlap answers it. */
export function overlaps(
  set: OutlineSet,
  combined: Combined,
  materials: (string | null)[],
  bonds: Bond[],
  mmPerUnit: number,
): Finding[] {
  if (materials.length < 2) return []
  const pairs = new Map<string, [number, number]>()
  const fillings = [...combined.whole.map(({ inside }) => inside), ...combined.tangled.flatMap((t) => t.fillings)]
  for (const { overlap } of fillings) if (overlap) pairs.set(overlap.join(), overlap)
  const findings: Finding[] = []
  for (const [key, [first, second]] of pairs) {
    const { loops } = loopsWhere(set, combined, ({ overlap }) => overlap?.join() === key)
    loops.area.forEach((area, k) => {
      if (area <= 0) return
      const [from, to] = [loops.loopStart[k], loops.loopStart[k + 1]]
      const e = loops.edges.ends
      const at = interiorPoint(loops.edges, from, to) ?? [e[4 * from], e[4 * from + 1]]
      const params = {
        first: materials[first] ?? 'no material',
        second: materials[second] ?? 'no material',
        area: area * mmPerUnit * mmPerUnit,
        x: at[0],
        y: at[1],
      }
      const bond = bonds.find((b) => insideLoop(loops.edges, from, to, b.at[0], b.at[1]))
      const answered = bond && (bond.is === 'bonded' || bond.is === 'contact')
      findings.push(
        answered
          ? combineFinding('overlap-answered', { ...params, is: bond.is }, at)
          : combineFinding('material-overlap', params, at, Math.sqrt(area)),
      )
    })
  }
  return findings
}

/** Faces between outlines thinner than the duplicate tolerance that `known` findings do not report already. */
export function thinOverlaps({ tangled }: Combined, limit: number, known: Finding[], mmPerUnit: number): Finding[] {
  return tangled.flatMap(({ tangle }) =>
    thinCells(tangle.arrangement, limit)
      .filter(({ at, extent }) => !known.some((k) => k.at && Math.hypot(k.at[0] - at[0], k.at[1] - at[1]) <= extent))
      .map(({ at, width, extent }) =>
        combineFinding('overlap-thin', { width: width * mmPerUnit, length: extent * mmPerUnit, x: at[0], y: at[1] }, at, extent),
      ),
  )
}
