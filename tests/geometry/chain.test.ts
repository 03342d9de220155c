import { expect, test } from 'vitest'
import type { OutlineSet } from '@/lib/geometry/outlineSet'
import { codesOf, Drawn } from './drawn'

/** every edge runs into the next to the last bit, the last into the first */
function expectClosed({ edges, loopStart, count }: OutlineSet): void {
  for (let k = 0; k < count; k++)
    for (let i = loopStart[k]; i < loopStart[k + 1]; i++) {
      const next = i + 1 === loopStart[k + 1] ? loopStart[k] : i + 1
      expect([edges.ends[4 * i + 2], edges.ends[4 * i + 3]]).toEqual([edges.ends[4 * next], edges.ends[4 * next + 1]])
    }
}

test('four lines out of order and sense give one outline of 2400', () => {
  const set = new Drawn().line(60, 40, 0, 40).line(0, 0, 60, 0).line(0, 0, 0, 40).line(60, 40, 60, 0).outlines()
  expect(set.count).toBe(1)
  expect(set.area[0]).toBe(2400)
  expect(set.findings).toEqual([])
  expectClosed(set)
})

test('a line gap of 0.004 along its own line is bridged and the area stays 70 × 40', () => {
  const set = new Drawn()
    .line(0, 0, 70, 0)
    .line(70, 0, 70, 40)
    .line(70, 40, 33.002, 40)
    .line(32.998, 40, 0, 40)
    .line(0, 40, 0, 0)
    .outlines({ lastDigit: 0 })
  expect(set.area[0]).toBe(2800)
  expect(codesOf(set)).toEqual(['gap-closed'])
  expect(set.repairs).toHaveLength(1)
  expect(set.repairs[0].gap).toBeWithin(0.004, { absolute: 1e-12 })
  expectClosed(set)
})

test('a gap of 0.004 at a corner is closed where the carriers cross', () => {
  const set = new Drawn()
    .line(0, 0, 70, 0)
    .line(70, 0.004, 70, 40)
    .line(70, 40, 0, 40)
    .line(0, 40, 0, 0)
    .outlines({ lastDigit: 0 })
  expect(set.area[0]).toBe(2800)
  expect(set.findings[0].params.how).toBe('carriers extended')
  expectClosed(set)
})

test('an outline left open by 0.2 is no outline and says 0.20 mm open', () => {
  const set = new Drawn()
    .line(0, 0, 30, 0)
    .line(30, 0, 30, 40)
    .line(30, 40, 15.1, 40)
    .line(14.9, 40, 0, 40)
    .line(0, 40, 0, 0)
    .outlines()
  expect(set.count).toBe(0)
  expect(set.openStart).toEqual(Uint32Array.of(0, 5))
  expect(set.findings[0].message).toMatch(/^0\.20 mm open at \(15, 40\)/)
})

test('a hole in a plate has depth 1 and an island in the hole depth 2', () => {
  const set = new Drawn().rectangle(0, 0, 100, 100).circle(50, 50, 30).lines(40, 40, 60, 60).outlines()
  expect([...set.area].map(Math.round).sort((a, b) => a - b)).toEqual([400, 2827, 10000])
  expect([...set.depth].sort()).toEqual([0, 1, 2])
})
