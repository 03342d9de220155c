import { expect, test } from 'vitest'
import { arrange, MOST_CROSSINGS } from '@/lib/geometry/arrangement/arrange'
import { facesOf } from '@/lib/geometry/arrangement/faces'
import { regionOf } from '@/lib/geometry/arrangement/regionOf'
import { emptyTable, pushLine } from '@/lib/geometry/edges'
import { setOf } from './setOf'
import { polygon, rectangle } from './shapes'

function grid(lines: number) {
  const table = emptyTable()
  for (let k = 0; k < lines; k++) {
    pushLine(table, 0, k, lines, k + 0.3, 0)
    pushLine(table, k, 0, k + 0.3, lines, 0)
  }
  return table
}

test('2,000 lines that cross 2,000 others are refused within seconds, not arranged for minutes', () => {
  const table = grid(2000)
  expect(arrange(table, new Uint32Array(table.count), 1, 1e-6)).toBeNull()
  expect(facesOf(table, null, { snap: 1e-6 }).tooMany).toBe(true)
}, 20_000)

test('two combs whose teeth cross more often than the limit give an error that names the number', () => {
  const teeth = Math.ceil(Math.sqrt(MOST_CROSSINGS) / 2) + 2
  const comb: [number, number][] = [[0, 0]]
  for (let k = 0; k < teeth; k++)
    comb.push([4 * k + 1, -10], [4 * k + 1.5, 4 * teeth + 10], [4 * k + 2.5, 4 * teeth + 10], [4 * k + 3, -10])
  comb.push([4 * teeth + 10, -10], [4 * teeth + 10, -20], [-5, -20])
  const across = comb.map(([x, y]): [number, number] => [y, x]).reverse()
  const { set, tolerances } = setOf([rectangle(0, 0, 1, 1)])
  const crossing = setOf([polygon(...comb), polygon(...across)])
  const all = { ...crossing.set, clusters: [[0, 1]] }
  const makeUp = [0, 1].map((k) => ({ at: [all.at[2 * k], all.at[2 * k + 1]] as [number, number], does: 'add' as const }))
  const answer = regionOf(all, { makeUp, part: null, bonds: [] }, crossing.tolerances)
  expect(answer.region).toBeNull()
  expect(answer.findings.map(({ code, params }) => [code, params.most])).toEqual([['too-many-crossings', MOST_CROSSINGS]])
  expect(regionOf(set, { makeUp: null, part: null, bonds: [] }, tolerances).region?.pieces).toBe(1)
})

test('edges without length, a single line and no edges at all are arranged without fault', () => {
  expect(arrange(emptyTable(), new Uint32Array(0), 1, 1e-9)?.count).toBe(0)
  const point = emptyTable()
  pushLine(point, 1, 1, 1, 1, 0)
  expect(arrange(point, new Uint32Array(1), 1, 1e-9)?.count).toBe(0)
  const line = emptyTable()
  pushLine(line, 0, 0, 1, 1, 0)
  expect(arrange(line, new Uint32Array(1), 1, 1e-9)?.count).toBe(1)
})
