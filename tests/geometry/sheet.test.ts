import { expect, test } from 'vitest'
import { nearestOutlines } from '@/lib/geometry/nearestOutlines'
import { codesOf, Drawn } from './drawn'

/** a box section of 40 × 20 × 2 with its lower left corner at x, y */
const box = (drawn: Drawn, x: number, y: number) => drawn.rectangle(x, y, x + 40, y + 20).rectangle(x + 2, y + 2, x + 38, y + 18)

/** a sheet of n box sections, 100 apart */
function sheet(n: number): Drawn {
  const drawn = new Drawn()
  for (let k = 0; k < n; k++) box(drawn, 20 + 100 * (k % 5), 20 + 80 * Math.floor(k / 5))
  return drawn
}

test('20 box sections 60 apart are 20 groups of 2 outlines, with bounds', () => {
  const set = sheet(20).outlines()
  expect(set.groups).toHaveLength(20)
  expect(set.groups[6]).toEqual({ minX: 120, minY: 100, maxX: 160, maxY: 120, outlines: 2 })
  expect([...set.group.subarray(12, 14)]).toEqual([6, 6])
  expect(codesOf(set)).toEqual(['groups-apart'])
})

test('two angles back to back, 10 apart, are one group', () => {
  const angle = (side: 1 | -1): [number, number][] => [
    [5 * side, 0],
    [65 * side, 0],
    [65 * side, 8],
    [13 * side, 8],
    [13 * side, 90],
    [5 * side, 90],
  ]
  expect(new Drawn().polyline(angle(1)).polyline(angle(-1)).outlines().groups).toHaveLength(1)
})

test('600 screws of 3 outlines between 20 box sections come to 620 groups', () => {
  const drawn = sheet(20)
  for (let n = 0; n < 600; n++) {
    const x = 1000 + 20 * (n % 30)
    const y = 20 * Math.floor(n / 30)
    drawn.circle(x, y, 3).circle(x, y, 2).circle(x, y, 1)
  }
  expect(drawn.outlines().groups).toHaveLength(620)
})

test('a frame round 6 box sections is offered to be left out, and is a group of its own', () => {
  const set = sheet(6).rectangle(0, 0, 600, 400).outlines()
  expect(set.frames).toEqual([12])
  expect(set.groups).toHaveLength(7)
  expect(codesOf(set)).toEqual(['frame-found', 'groups-apart'])
})

test('two frames, one in the other, are both offered', () => {
  expect(sheet(6).rectangle(0, 0, 600, 400).rectangle(-10, -10, 610, 410).outlines().frames).toEqual([13, 12])
})

test('a frame of 400 × 277 round two solid bars is known by the size of an A3 sheet less 10 mm a side', () => {
  const set = new Drawn().rectangle(0, 0, 400, 277).rectangle(50, 50, 90, 60).rectangle(200, 50, 240, 60).outlines()
  expect(set.frames).toEqual([0])
})

test('a rectangle of 500 × 300 round one solid bar, of no sheet’s size, is offered too; round holes make it a plate', () => {
  expect(new Drawn().rectangle(0, 0, 500, 300).rectangle(50, 50, 110, 90).outlines().frames).toEqual([0])
  expect(new Drawn().rectangle(0, 0, 500, 300).circle(50, 50, 11).circle(450, 50, 11).outlines().frames).toEqual([])
})

test('an A4 frame round a profile that fills two thirds of it is offered; a tube of 280 × 200 is none', () => {
  expect(new Drawn().rectangle(0, 0, 277, 190).rectangle(10, 10, 245, 160).outlines().frames).toEqual([0])
  expect(new Drawn().rectangle(0, 0, 280, 200).rectangle(20, 40, 260, 160).outlines().frames).toEqual([])
})

test('a plate of 120 × 80 with four holes and a box section are no frames', () => {
  const plate = new Drawn().rectangle(0, 0, 120, 80).circle(15, 15, 4).circle(105, 15, 4).circle(15, 65, 4).circle(105, 65, 4)
  expect(plate.outlines().findings).toEqual([])
  expect(box(new Drawn(), 0, 0).outlines().findings).toEqual([])
})

test('a title block of 6 cells in the corner of a frame is offered, the frame too', () => {
  const drawn = sheet(6).rectangle(0, 0, 600, 400)
  for (let column = 0; column < 2; column++)
    for (let row = 0; row < 3; row++) drawn.rectangle(480 + 60 * column, 10 * row, 540 + 60 * column, 10 * row + 10)
  const set = drawn.outlines()
  expect(set.titleBlocks).toEqual([[13, 14, 15, 16, 17, 18]])
  expect(set.frames).toEqual([12])
})

test('a title block of lines that end on the frame is offered with it, as the 5 areas between them', () => {
  const drawn = box(new Drawn(), 60, 60).rectangle(0, 0, 400, 277)
  drawn.line(300, 0, 300, 40).line(300, 40, 400, 40).line(300, 20, 400, 20).line(350, 0, 350, 40)
  const set = drawn.outlines()
  expect(set.frames).toEqual([2])
  expect(set.titleBlocks).toEqual([[3, 4, 5, 6, 7]])
})

test('an I of three plates that touch is no title block', () => {
  const set = new Drawn().rectangle(0, 0, 100, 10).rectangle(45, 10, 55, 90).rectangle(0, 90, 100, 100).outlines()
  expect(set.titleBlocks).toEqual([])
  expect([...set.depth]).toEqual([0, 0, 0])
})

test('every outline of a sheet is picked by its own name', () => {
  const set = sheet(20).outlines()
  for (let k = 0; k < set.count; k++) {
    expect([...nearestOutlines(set, [[set.at[2 * k], set.at[2 * k + 1]]])]).toEqual([k])
  }
})

test('outlines that share a side are named on a side of their own', () => {
  const set = new Drawn().rectangle(0, 0, 10, 40).rectangle(10, 0, 14, 40).outlines()
  for (const k of [0, 1]) {
    expect([...nearestOutlines(set, [[set.at[2 * k], set.at[2 * k + 1]]])]).toEqual([k])
  }
})
