import { describe, expect, it } from 'vitest'
import { readDrawing } from '@/lib/dxf/read'
import { dxfParserOpinion } from '@/lib/opinions/dxfParser'
import { caseBytes, references } from '../cases/reference'

const bytesOf = (text: string) => new TextEncoder().encode(text)
const entities = (...groups: (string | number)[]) =>
  bytesOf(`0\nSECTION\n2\nENTITIES\n${groups.map((group) => `${group}\n`).join('')}0\nENDSEC\n0\nEOF\n`)
const line = (x0: number, y0: number, x1: number, y1: number) => [0, 'LINE', 8, 'A', 10, x0, 20, y0, 11, x1, 21, y1]

describe('drawings read again by dxf-parser', () => {
  /** polylines of old and extrusion directions: outside what the library reads right */
  const outside = ['p13.dxf', 'p15.dxf']

  it.each(references().map(({ file }) => file))('%s agrees, or is not asked', (file) => {
    const bytes = caseBytes(file)
    const { agrees, sentence } = dxfParserOpinion(bytes, readDrawing(bytes))
    expect([agrees, sentence]).toEqual([outside.includes(file) ? null : true, expect.any(String)])
  })

  it('a line that the engine lost is seen, with its place', () => {
    const whole = entities(...line(0, 0, 10, 0), ...line(10, 0, 10, 5))
    const { agrees, sentence } = dxfParserOpinion(whole, readDrawing(entities(...line(0, 0, 10, 0))))
    expect(agrees).toBe(false)
    expect(sentence).toContain('0 of 1 edges are not found there and 1 others are')
  })

  it('a coordinate that differs by 1e-6 of the size is seen', () => {
    const { agrees } = dxfParserOpinion(entities(...line(0, 0, 10, 0)), readDrawing(entities(...line(0, 0, 10.00001, 0))))
    expect(agrees).toBe(false)
  })

  it.each([
    ['an old polyline, whose reader can loop for ever', entities(0, 'POLYLINE', 8, 'A', 66, 1, ...line(0, 0, 1, 0)), 'POLYLINE'],
    ['a comment', entities(999, 'made by hand', ...line(0, 0, 1, 0)), 'comment'],
    ['an extrusion direction', entities(0, 'CIRCLE', 8, 'A', 10, 1, 20, 1, 40, 1, 230, -1), 'extrusion'],
    ['vertex identifiers', entities(0, 'LWPOLYLINE', 8, 'A', 90, 2, 70, 0, 10, 0, 20, 0, 91, 7, 10, 1, 20, 0), 'identifiers'],
  ])('%s: not asked, and why', (_, bytes, words) => {
    const { agrees, sentence } = dxfParserOpinion(bytes, readDrawing(bytes))
    expect(agrees).toBeNull()
    expect(sentence).toContain(words)
  })
})
