import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { writeRegionDxf } from '@/lib/dxf/write'
import { type Edge, emptyTable, pushEdge } from '@/lib/geometry/edges'
import { DEFAULT_RECIPE, type Recipe } from '@/lib/geometry/recipe'
import type { Region } from '@/lib/geometry/region'
import { sectionTask, type TaskResult } from '@/lib/jobs/tasks'
import { fixture, read } from '../support/dxf'

interface Case {
  file: string
  unit: { mmPerUnit: number }
  tolerance: number
  makeUp: Recipe['makeUp']
}
const cases: Case[] = JSON.parse(readFileSync(path.join(import.meta.dirname, '../../fixtures/cases/expected.json'), 'utf8'))

const answer = (bytes: string | Uint8Array, recipe: Partial<Recipe>): TaskResult =>
  sectionTask(read(bytes), { name: 'x.dxf', bytes: 0, sha256: '' }, { ...DEFAULT_RECIPE, ...recipe }, {})

/** All numbers of a value, by path. */
function numbersOf(value: unknown, at = ''): [string, number][] {
  if (typeof value === 'number') return [[at, value]]
  if (value === null || typeof value !== 'object') return []
  return Object.entries(value).flatMap(([key, inner]) => (key === 'origin' ? [] : numbersOf(inner, `${at}.${key}`)))
}

const one = (edges: Edge[], hole = 0): Region => {
  const table = emptyTable()
  for (const edge of edges) pushEdge(table, edge)
  return {
    edges: table,
    loopStart: Uint32Array.of(0, edges.length),
    hole: Uint8Array.of(hole),
    piece: Uint32Array.of(0),
    pieces: 1,
  }
}
const point = (x: number, y: number) => ({ x, y })

describe('the clean region as DXF', () => {
  it.each(cases.map((c): [string, Case] => [c.file, c]))(
    '%s reads back to the same section to 1e-12',
    (file, { unit, tolerance, makeUp }) => {
      const first = answer(fixture('cases', file), { unit: unit.mmPerUnit, tolerance, makeUp })
      if (!first.region || !first.answer.section) throw new Error(first.answer.findings.map(({ message }) => message).join(' '))
      const text = writeRegionDxf(first.region, { unit: 'mm' })
      const again = answer(text, { unit: 'mm', tolerance: 1e-6 })
      expect(again.drawing.declared).toBe('mm')
      expect(again.answer.findings.filter(({ severity }) => severity === 'error')).toEqual([])
      const [wanted, got] = [first.answer.section, again.answer.section]
      if (!got) throw new Error('no section')
      const { radius } = wanted.circle
      const powers = [radius, wanted.area, wanted.elastic.xTop, wanted.ip]
      const gotNumbers = new Map(numbersOf(got))
      for (const [key, value] of numbersOf(wanted)) {
        if (/theta|angle/i.test(key)) continue
        if (/^\.(j|shearCentre|iw|shearArea)\b/.test(key)) {
          // another last bit can make another mesh: element figures come back within their own ±
          const own = wanted.origin[key.slice(1).replace(/^j\..*/, 'j')]?.plusMinus?.numerics ?? 0
          expect(gotNumbers.get(key), key).toBeWithin(value, { absolute: 2 * own + 1e-12 * wanted.ip * wanted.area })
          continue
        }
        const scale = powers.find((power) => power >= Math.abs(value)) ?? Math.abs(value)
        expect(gotNumbers.get(key), key).toBeWithin(value, {
          absolute: (/plastic/i.test(key) ? 1e-10 : 1e-12) * Math.max(scale, radius),
        })
      }
    },
  )

  it('puts outer loops on OUTER and holes on HOLES, circles as CIRCLE, lines and arcs as one closed LWPOLYLINE', () => {
    const circle: Edge = {
      kind: 1,
      a: point(7, 5),
      b: point(7, 5),
      centre: point(5, 5),
      radius: 2,
      start: 0,
      sweep: -2 * Math.PI,
      source: 0,
    }
    const hole = read(writeRegionDxf(one([circle], 1), { unit: 'in' }))
    expect([hole.read, hole.declared, hole.layers[hole.entities.layer[0]].name]).toEqual([{ CIRCLE: 1 }, 'in', 'HOLES'])
    const half: Edge = {
      kind: 1,
      a: point(1, 0),
      b: point(-1, 0),
      centre: point(0, 0),
      radius: 1,
      start: 0,
      sweep: Math.PI,
      source: 0,
    }
    const flat: Edge = { kind: 0, a: point(-1, 0), b: point(1, 0), source: 0 }
    const outer = read(writeRegionDxf(one([half, flat]), { unit: 'mm' }))
    expect([outer.read, outer.layers[outer.entities.layer[0]].name, outer.entities.closed[0]]).toEqual([
      { LWPOLYLINE: 1 },
      'OUTER',
      1,
    ])
  })

  it('an ellipse with axes that are not perpendicular keeps its points and its sense', () => {
    const sheared: Edge = {
      kind: 2,
      a: point(3, 0),
      b: point(1, 2),
      centre: point(0, 0),
      u: point(3, 0),
      v: point(1, 2),
      start: 0,
      sweep: Math.PI / 2,
      source: 0,
    }
    for (const edge of [sheared, { ...sheared, a: sheared.b, b: sheared.a, start: Math.PI / 2, sweep: -Math.PI / 2 }]) {
      const { edges } = read(writeRegionDxf(one([edge]), { unit: 'mm' }))
      const [cx, cy, ux, uy, vx, vy, start, sweep] = edges.shapes
      const middle = start + sweep / 2
      const at = [cx + ux * Math.cos(middle) + vx * Math.sin(middle), cy + uy * Math.cos(middle) + vy * Math.sin(middle)]
      expect(at[0]).toBeWithin(3 * Math.SQRT1_2 + Math.SQRT1_2, { absolute: 1e-14 })
      expect(at[1]).toBeWithin(2 * Math.SQRT1_2, { absolute: 1e-14 })
    }
  })

  it('an arc of 350° is two bulges, and comes back as the same circle', () => {
    const [start, sweep] = [0.1, (350 * Math.PI) / 180]
    const on = (t: number) => point(5 * Math.cos(t), 5 * Math.sin(t))
    const arc: Edge = { kind: 1, a: on(start), b: on(start + sweep), centre: point(0, 0), radius: 5, start, sweep, source: 0 }
    const chord: Edge = { kind: 0, a: arc.b, b: arc.a, source: 0 }
    const { edges } = read(writeRegionDxf(one([arc, chord]), { unit: 'mm' }))
    expect(edges.count).toBe(3)
    for (const k of [edges.shape[0], edges.shape[1]]) {
      expect(Math.hypot(edges.shapes[k], edges.shapes[k + 1])).toBeWithin(0, { absolute: 1e-13 })
      expect(edges.shapes[k + 2]).toBeWithin(5, { absolute: 1e-14 * 5 })
    }
  })

  it('writes 0.1 + 0.2 and 1e-9 so that they read back to the last bit', () => {
    const line: Edge = { kind: 0, a: point(0.1 + 0.2, 1e-9), b: point(1e11, -0), source: 0 }
    const text = writeRegionDxf(one([line, { ...line, a: line.b, b: line.a }]), { unit: 'mm' })
    expect([...read(text).edges.ends.slice(0, 4)]).toEqual([0.30000000000000004, 1e-9, 1e11, 0])
  })
})
