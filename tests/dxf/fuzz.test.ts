import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Drawing } from '@/lib/dxf/drawing'
import { fixture, read, select } from '../support/dxf'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 300)
const files = [
  ...Array.from({ length: 24 }, (_, i) => fixture('cases', `p${String(i + 1).padStart(2, '0')}.dxf`)),
  fixture('dxf', 'p01-binary.dxf'),
  fixture('dxf', 'p14-binary.dxf'),
]

/** Reads and selects within a second of the processor's time; whatever comes is finite, and every edge has its entity. */
function survives(bytes: Uint8Array): Drawing {
  const started = process.cpuUsage()
  const drawing = read(bytes)
  const selection = select(drawing)
  const { user, system } = process.cpuUsage(started)
  expect((user + system) / 1e6).toBeLessThan(1)
  const { edges, entities } = drawing
  for (let i = 0; i < 4 * edges.count; i++) expect(Number.isFinite(edges.ends[i])).toBe(true)
  for (let i = 0; i < edges.shapesUsed; i++) expect(Number.isFinite(edges.shapes[i])).toBe(true)
  for (let i = 0; i < edges.count; i++) expect(edges.source[i]).toBeLessThan(entities.count)
  for (let row = 0; row < entities.count; row++) {
    expect(drawing.layers[entities.layer[row]]).toBeDefined()
    expect(drawing.lineTypes[entities.lineType[row]]).toBeDefined()
    expect(drawing.spaces[entities.space[row]]).toBeDefined()
  }
  for (const { message } of [...drawing.findings, ...selection.findings]) expect(message.length).toBeLessThan(1500)
  return drawing
}

const file = fc.constantFrom(...files)
const share = fc.double({ min: 0, max: 1, noNaN: true })

describe('any mutation of a drawing', () => {
  it('with bytes changed, put in or taken out is read or refused, never thrown over', () => {
    const change = fc.tuple(share, fc.constantFrom('set', 'insert', 'delete'), fc.integer({ min: 0, max: 255 }))
    fc.assert(
      fc.property(file, fc.array(change, { minLength: 1, maxLength: 12 }), (bytes, changes) => {
        const list = [...bytes]
        for (const [where, how, value] of changes) {
          const at = Math.floor(where * list.length)
          if (how === 'set') list[at] = value
          else list.splice(at, how === 'delete' ? 1 + (value & 31) : 0, ...(how === 'insert' ? [value] : []))
        }
        survives(Uint8Array.from(list))
      }),
      { numRuns: RUNS },
    )
  })

  it('with lines exchanged, doubled or lost is read or refused', () => {
    const change = fc.tuple(share, share, fc.constantFrom('swap', 'copy', 'drop'))
    fc.assert(
      fc.property(fc.constantFrom(...files.slice(0, 24)), fc.array(change, { minLength: 1, maxLength: 6 }), (bytes, changes) => {
        const lines = new TextDecoder('latin1').decode(bytes).split('\n')
        for (const [a, b, how] of changes) {
          const [i, j] = [Math.floor(a * lines.length), Math.floor(b * lines.length)]
          if (how === 'swap') [lines[i], lines[j]] = [lines[j], lines[i]]
          else lines.splice(i, how === 'drop' ? 2 : 0, ...(how === 'copy' ? lines.slice(j, j + 2) : []))
        }
        survives(Uint8Array.from(lines.join('\n'), (c) => c.charCodeAt(0)))
      }),
      { numRuns: RUNS },
    )
  })

  it('cut short before its ENTITIES end gives an error, wherever it is cut', () => {
    fc.assert(
      fc.property(fc.constantFrom(...files.slice(0, 24)), share, (bytes, where) => {
        const text = new TextDecoder('latin1').decode(bytes)
        const end = text.indexOf('ENDSEC', text.search(/\n\s*2\r?\nENTITIES/))
        const drawing = survives(bytes.slice(0, Math.floor(where * end)))
        expect(drawing.findings.some(({ severity }) => severity === 'error')).toBe(true)
      }),
      { numRuns: RUNS },
    )
  })

  it('of random groups is read or refused', () => {
    const code = fc.constantFrom(
      0,
      2,
      5,
      6,
      8,
      10,
      11,
      20,
      21,
      30,
      40,
      41,
      42,
      44,
      45,
      50,
      51,
      67,
      70,
      71,
      72,
      73,
      90,
      91,
      92,
      93,
      94,
      95,
      96,
      97,
      210,
      230,
      999,
      1000,
    )
    const value = fc.oneof(
      fc.constantFrom(
        'LINE',
        'ARC',
        'CIRCLE',
        'ELLIPSE',
        'SPLINE',
        'HATCH',
        'LWPOLYLINE',
        'POLYLINE',
        'VERTEX',
        'SEQEND',
        'INSERT',
        'BLOCK',
        'ENDBLK',
        'SECTION',
        'ENDSEC',
        'BLOCKS',
        'ENTITIES',
        'EOF',
        'A',
        'DIMENSION',
      ),
      fc.integer({ min: -5, max: 40 }).map(String),
      fc.double().map(String),
    )
    fc.assert(
      fc.property(fc.array(fc.tuple(code, value), { maxLength: 300 }), (groups) => {
        survives(new TextEncoder().encode(groups.map(([c, v]) => `${c}\n${v}\n`).join('')))
      }),
      { numRuns: RUNS },
    )
  })
})
