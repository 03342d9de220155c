import { expect, test } from 'vitest'
import { outlinesOf } from '@/lib/geometry/outlines'
import type { Bond } from '@/lib/geometry/recipe'
import { codesOf, Drawn, TOLERANCES } from './drawn'

const answered = (drawn: Drawn, bonds: Bond[]) =>
  outlinesOf(
    drawn.edges,
    new Uint32Array(drawn.edges.count).map((_, i) => i),
    TOLERANCES,
    { arcs: [], mmPerUnit: 1, bonds },
  )

test('an outline with a loose tail is the outline, and the tail is named', () => {
  const set = new Drawn().lines(0, 0, 10, 10).line(10, 10, 20, 20).outlines()
  expect([...set.area]).toEqual([100])
  expect([...set.depth]).toEqual([0])
  expect(codesOf(set)).toEqual(['branches'])
})

test('a rectangle parted by a line asks "metal or void?" of both faces, which wait with depth −1', () => {
  const set = new Drawn()
    .line(0, 0, 6, 0)
    .line(6, 0, 10, 0)
    .line(10, 0, 10, 10)
    .line(10, 10, 6, 10)
    .line(6, 10, 0, 10)
    .line(0, 10, 0, 0)
    .line(6, 0, 6, 10)
    .outlines()
  expect([...set.area].sort((a, b) => a - b)).toEqual([40, 60])
  expect([...set.depth]).toEqual([-1, -1])
  expect([...set.undecided]).toEqual([1, 1])
  const questions = set.findings.filter(({ code }) => code === 'face-metal-or-void')
  expect(questions.map(({ params }) => params.area).sort()).toEqual([40, 60])
})

test('a single line across a closed outline has no thickness: it stays open, the outline stays 100', () => {
  const set = new Drawn().lines(0, 0, 10, 10).line(6, 0, 6, 10).outlines()
  expect([...set.area]).toEqual([100])
  expect([...set.depth]).toEqual([0])
  expect(codesOf(set)).toEqual(['chain-open'])
})

test('a lug of three lines on the side of a plate asks for its 12 mm², and "metal" makes it an outline', () => {
  const drawn = new Drawn().lines(0, 0, 10, 10).line(10, 2, 13, 2).line(13, 2, 13, 6).line(13, 6, 10, 6)
  const asked = drawn.outlines()
  expect(codesOf(asked)).toEqual(['face-metal-or-void', 'outlines-touch'])
  expect([...asked.area]).toEqual([100, 12])
  expect([...asked.depth]).toEqual([0, -1])
  const metal = answered(drawn, [{ at: [11, 4], is: 'metal' }])
  expect([...metal.area]).toEqual([100, 12])
  expect([...metal.depth]).toEqual([0, 0])
  expect([...answered(drawn, [{ at: [11, 4], is: 'void' }]).area]).toEqual([100])
})

test('a notch of three lines on the inner side of a plate asks for both parts, and "void" cuts 12 mm²', () => {
  const drawn = new Drawn().rectangle(0, 0, 10, 10).line(10, 2, 7, 2).line(7, 2, 7, 6).line(7, 6, 10, 6)
  expect(drawn.outlines().findings.filter(({ code }) => code === 'face-metal-or-void')).toHaveLength(2)
  const set = answered(drawn, [
    { at: [9, 4], is: 'void' },
    { at: [2, 2], is: 'metal' },
  ])
  expect([...set.area]).toEqual([100, 12])
  expect([...set.depth]).toEqual([0, 1])
})

test('a rib whose end lies on another edge within 0.005 is cut in there and closes its face', () => {
  const set = new Drawn()
    .line(0, 0, 10, 0)
    .line(10, 0, 10, 10)
    .line(10, 10, 0, 10)
    .line(0, 10, 0, 4)
    .line(0, 4, 9.995, 4)
    .outlines({ lastDigit: 0 })
  expect(set.count).toBe(1)
  expect(set.area[0]).toBeWithin(60, { absolute: 0.05 })
})

test('answered "metal" and "void", a parted rectangle gives one outline of 60', () => {
  const drawn = new Drawn()
    .line(0, 0, 6, 0)
    .line(6, 0, 10, 0)
    .line(10, 0, 10, 10)
    .line(10, 10, 6, 10)
    .line(6, 10, 0, 10)
    .line(0, 10, 0, 0)
    .line(6, 0, 6, 10)
  const set = answered(drawn, [
    { at: [3, 5], is: 'metal' },
    { at: [8, 5], is: 'void' },
  ])
  expect([...set.area]).toEqual([60])
  expect([...set.depth]).toEqual([0])
})

test('inside a plate the answers turn round: void is an outline that cuts, metal is none', () => {
  const drawn = new Drawn()
    .rectangle(-5, -5, 15, 15)
    .line(0, 0, 6, 0)
    .line(6, 0, 10, 0)
    .line(10, 0, 10, 10)
    .line(10, 10, 6, 10)
    .line(6, 10, 0, 10)
    .line(0, 10, 0, 0)
    .line(6, 0, 6, 10)
  const set = answered(drawn, [
    { at: [3, 5], is: 'void' },
    { at: [8, 5], is: 'metal' },
  ])
  expect([...set.area]).toEqual([400, 60])
  expect([...set.depth]).toEqual([0, 1])
})

/** an inner rectangle of four lines with a web of two lines between its long sides, each line ending on a side */
const withWeb = () => new Drawn().lines(3, 3, 57, 37).line(29, 3, 29, 37).line(31, 3, 31, 37)

test('a web of two lines across a chamber asks for 884 + 68 + 884 mm²; one line alone does not', () => {
  const asked = withWeb().outlines()
  expect([...asked.area]).toEqual([1836, 884, 68, 884])
  expect([...asked.undecided]).toEqual([0, 1, 1, 1])
  expect([...new Drawn().lines(3, 3, 57, 37).line(29, 3, 29, 37).outlines().area]).toEqual([1836])
})

test('a web that ends on a web line asks for four faces: 884 + 68 + 2 × 416 + 52 mm² make the chamber', () => {
  const set = withWeb().line(31, 19, 57, 19).line(31, 21, 57, 21).outlines()
  expect([...set.area.slice(1)].sort((a, b) => a - b)).toEqual([52, 68, 416, 416, 884])
  expect(codesOf(set)).not.toContain('chain-open')
})

test('18 parallel lines across a plate are hatching: they stay open, the plate stays 100', () => {
  const drawn = new Drawn().lines(0, 0, 10, 10)
  for (let n = 1; n <= 18; n++) drawn.line(0.5 * n, 0, 0.5 * n, 10)
  const set = drawn.outlines()
  expect([...set.area]).toEqual([100])
  expect(codesOf(set)).toEqual(new Array(18).fill('chain-open'))
})
