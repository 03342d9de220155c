import { readFileSync } from 'node:fs'
import path from 'node:path'
import { describe, expect, it } from 'vitest'
import { ARC, BEZIER, ELLIPSE, LINE } from '@/lib/geometry/edges'
import { findingsOf, fixture, read, select } from '../support/dxf'

interface Case {
  file: string
  format: string
  unit: { mmPerUnit: number; declared: string }
}
const cases: Case[] = JSON.parse(readFileSync(path.join(import.meta.dirname, '../../fixtures/cases/expected.json'), 'utf8'))

/** What each drawing holds in its model: entities read by kind, and edges taken (lines, arcs, elliptical arcs, Bézier pieces). */
const HOLDS: Record<string, [read: Record<string, number>, lines: number, arcs: number, ellipses: number, beziers: number]> = {
  'p01.dxf': [{ LINE: 4 }, 4, 0, 0, 0],
  'p02.dxf': [{ LWPOLYLINE: 2 }, 8, 8, 0, 0],
  'p03.dxf': [{ LWPOLYLINE: 1 }, 12, 4, 0, 0],
  'p04.dxf': [{ LWPOLYLINE: 1 }, 8, 4, 0, 0],
  'p05.dxf': [{ LWPOLYLINE: 1 }, 6, 3, 0, 0],
  'p06.dxf': [{ LINE: 6, ARC: 4 }, 6, 4, 0, 0],
  'p07.dxf': [{ CIRCLE: 2 }, 0, 2, 0, 0],
  'p08.dxf': [{ ELLIPSE: 2 }, 0, 0, 2, 0],
  'p09.dxf': [{ LWPOLYLINE: 2 }, 23, 13, 0, 0],
  'p10.dxf': [{ LINE: 4, ARC: 4, LWPOLYLINE: 3 }, 16, 16, 0, 0],
  'p11.dxf': [{ CIRCLE: 1, SPLINE: 1 }, 0, 1, 0, 10],
  'p12.dxf': [{ LINE: 3, SPLINE: 2 }, 3, 0, 0, 8],
  'p13.dxf': [{ POLYLINE: 2 }, 8, 8, 0, 0],
  'p14.dxf': [{ LINE: 16, ARC: 16, LWPOLYLINE: 2, INSERT: 9 }, 26, 14, 2, 0],
  'p15.dxf': [{ LINE: 2, ARC: 1, CIRCLE: 1, ELLIPSE: 1, LWPOLYLINE: 1 }, 10, 4, 1, 0],
  'p16.dxf': [{ LINE: 5, ARC: 1 }, 5, 1, 0, 0],
  'p17.dxf': [{ LINE: 4, ARC: 4, LWPOLYLINE: 1 }, 8, 8, 0, 0],
  'p18.dxf': [{ CIRCLE: 1, LWPOLYLINE: 3 }, 12, 1, 0, 0],
  'p19.dxf': [{ CIRCLE: 1, LWPOLYLINE: 2 }, 7, 2, 0, 0],
  'p20.dxf': [{ CIRCLE: 2, LWPOLYLINE: 1 }, 4, 2, 0, 0],
  'p21.dxf': [{ LINE: 2, CIRCLE: 2, LWPOLYLINE: 4, HATCH: 1 }, 12, 6, 0, 0],
  'p22.dxf': [{ LINE: 11 }, 11, 0, 0, 0],
  'p23.dxf': [{ LINE: 9, ARC: 7, CIRCLE: 2 }, 9, 9, 0, 0],
  'p24.dxf': [{ LWPOLYLINE: 8 }, 32, 16, 0, 0],
}
const VERSION: Record<string, string> = {
  R12: 'AC1009',
  R2000: 'AC1015',
  R2004: 'AC1018',
  R2007: 'AC1021',
  R2010: 'AC1024',
  R2013: 'AC1027',
  R2018: 'AC1032',
}

describe('the 24 reference drawings', () => {
  it.each(cases.map((c): [string, Case] => [c.file, c]))('%s: kinds, counts, unit and version', (file, { format, unit }) => {
    const drawing = read(fixture('cases', file))
    const [kinds, ...counts] = HOLDS[file]
    expect(drawing.read).toEqual(kinds)
    const taken = select(drawing).edges
    const count = (kind: number) => taken.filter((i) => drawing.edges.kind[i] === kind).length
    expect([LINE, ARC, ELLIPSE, BEZIER].map(count)).toEqual(counts)
    expect(drawing.declared).toBe(unit.declared)
    if (unit.declared !== 'none') expect(drawing.declaredMm).toBe(unit.mmPerUnit)
    expect(drawing.acadVersion).toBe(VERSION[format])
    expect(findingsOf(drawing).filter(({ severity }) => severity !== 'note')).toEqual([])
  })

  it('p13, a million units from the origin, keeps its coordinates to the last bit', () => {
    const text = new TextDecoder('latin1').decode(fixture('cases', 'p13.dxf'))
    const written = [...text.matchAll(/VERTEX[\s\S]*?\n\s*10\r?\n(.*?)\r?\n\s*20\r?\n(.*?)\r?\n/g)].map(([, x, y]) => [
      Number(x),
      Number(y),
    ])
    const { edges } = read(fixture('cases', 'p13.dxf'))
    expect(Array.from({ length: edges.count }, (_, i) => [edges.ends[4 * i], edges.ends[4 * i + 1]])).toEqual(written)
  })
})
