import { expect, test } from 'vitest'
import { ARC } from '@/lib/geometry/edges'
import { codesOf, Drawn } from './drawn'

test('an edge of 0.005, half the tolerance, keeps its two ends and the outline its 5 edges', () => {
  const set = new Drawn()
    .line(0, 0, 10, 0)
    .line(10, 0, 10, 0.005)
    .line(10, 0.005, 10, 10)
    .line(10, 10, 0, 10)
    .line(0, 10, 0, 0)
    .outlines()
  expect(set.loopStart).toEqual(Uint32Array.of(0, 5))
  expect(set.area[0]).toBe(100)
})

test('an edge of 0.004 with gaps of 0.001 at both ends is joined at both ends, not to itself', () => {
  const set = new Drawn()
    .line(0, 0, 9.999, 0)
    .line(10, 0, 10.004, 0)
    .line(10.005, 0, 20, 0)
    .line(20, 0, 20, 10)
    .line(20, 10, 0, 10)
    .line(0, 10, 0, 0)
    .outlines({ lastDigit: 0 })
  expect(set.area[0]).toBeWithin(200, { absolute: 1e-12 })
  expect(codesOf(set)).toEqual(['gap-closed', 'gap-closed'])
})

test('a chain of ends 0.008 apart, 0.016 wide, is an error and joins none of them at a tolerance of 0.01', () => {
  const set = new Drawn()
    .line(0, 0, 10, 0)
    .line(10.008, 0, 10.008, 10)
    .line(10.016, 0, 20, 0)
    .line(10.008, 10, 0, 10)
    .line(0, 10, 0, 0)
    .outlines({ lastDigit: 0 })
  expect(set.count).toBe(0)
  const [finding] = set.findings.filter(({ code }) => code === 'ends-ambiguous')
  expect(finding.severity).toBe('error')
  expect(finding.params).toMatchObject({ ends: 3 })
  expect(finding.size).toBeWithin(0.016, { absolute: 1e-12 })
})

test('gaps no wider than two last digits give one note for all: 3 gaps of 0.001 with half a digit 0.0005', () => {
  const set = new Drawn().line(0, 0, 9.999, 0).line(10, 0, 10, 9.999).line(10, 10, 0.001, 10).line(0, 10, 0, 0).outlines()
  expect(codesOf(set)).toEqual(['gaps-within-digits'])
  expect(set.findings[0].params.count).toBe(3)
  expect(set.area[0]).toBeWithin(100, { absolute: 1e-12 })
  expect(set.repairs).toHaveLength(3)
})

test('the lever arm of an arc of radius 100 lets an end off by 0.003 count as explained by digits of 0.001', () => {
  const at = (degrees: number) => [100 * Math.cos((degrees * Math.PI) / 180), 100 * Math.sin((degrees * Math.PI) / 180)]
  const [x, y] = at(90)
  const set = new Drawn()
    .arc(0, 0, 100, 0, 90)
    .line(x - 0.003, y, 0, 0)
    .line(0, 0, 100, 0)
    .outlines()
  expect(codesOf(set)).toEqual(['gaps-within-digits'])
})

test('a line and an arc that meet at 45° with a gap of 0.004 meet on both carriers: centre and radius stay', () => {
  const end = Math.SQRT1_2 * 10
  const set = new Drawn()
    .arc(0, 0, 10, 45, 180)
    .line(-10, 0, end, 0)
    .line(end, 0, end, end - 0.004)
    .outlines({ lastDigit: 0 })
  expect(set.findings.map(({ params }) => params.how)).toEqual(['carriers extended'])
  const arc = set.edges.kind.indexOf(ARC)
  expect([...set.edges.shapes.subarray(set.edges.shape[arc], set.edges.shape[arc] + 3)]).toEqual([0, 0, 10])
  const wanted = (10 ** 2 * 0.75 * Math.PI) / 2 + end ** 2 / 2
  expect(set.area[0]).toBeWithin(wanted, { relative: 1e-14 })
})

test('a line that overruns its tangent arc by 0.004 ends at the foot point, 0.004 back', () => {
  const set = new Drawn()
    .line(0, 0, 10.004, 0)
    .arc(10, 5, 5, 270, 360)
    .line(15, 5, 15, 20)
    .line(15, 20, 0, 20)
    .line(0, 20, 0, 0)
    .outlines({ lastDigit: 0 })
  expect(set.findings[0].params.how).toBe('joined at the tangent point')
  expect(set.area[0]).toBeWithin(300 - (25 - (25 * Math.PI) / 4), { relative: 1e-14 })
})

test('two tangent arcs apart by 0.006 along their common tangent meet on the line through their centres', () => {
  const bow = new Drawn()
    .arc(0, 0, 10, 0, 89.97)
    .arc(0, 6, 4, 90, 180)
    .line(-4, 6, -4, 0)
    .line(-4, 0, 10, 0)
    .outlines({ lastDigit: 0 })
  expect(bow.findings[0].params.how).toBe('joined at the tangent point')
  expect(bow.area[0]).toBeWithin(25 * Math.PI + 4 * Math.PI + 24, { relative: 1e-9 })
})

test('a corner gap of 0.004 × 0.003 could be bridged instead, at a loss of 6e-6, whichever way it is drawn', () => {
  const set = new Drawn()
    .line(0, 0, 9.996, 0)
    .line(10, 0.003, 10, 10)
    .line(10, 10, 0, 10)
    .line(0, 10, 0, 0)
    .outlines({ lastDigit: 0 })
  const back = new Drawn()
    .line(0, 10, 10, 10)
    .line(10, 10, 10, 0.003)
    .line(9.996, 0, 0, 0)
    .line(0, 0, 0, 10)
    .outlines({ lastDigit: 0 })
  for (const { repairs } of [set, back]) expect(repairs[0].area).toBeWithin(-6e-6, { relative: 1e-9 })
  expect(set.repairs[0].gap).toBeWithin(0.005, { relative: 1e-9 })
  expect(set.area[0]).toBe(100)
})

test('an arc that lacks 0.005 to its full circle is closed, and is one outline of πr² less 1e-4', () => {
  const set = new Drawn().arc(0, 0, 10, 0, 360 - (0.005 / 10) * (180 / Math.PI)).outlines({ lastDigit: 0 })
  expect(set.count).toBe(1)
  expect(set.area[0]).toBeWithin(100 * Math.PI, { absolute: 1e-4 })
})

test.each([1e-13, 1e-12, 1e-11, 1e-10, 1e-9, 1e-8, 1e-7, 1e-6, 1e-5, 1e-4, 1e-3])(
  'corners off by %s keep one outline, its area within displacement × perimeter',
  (off) => {
    const set = new Drawn()
      .line(0, 0, 10 + off, 0)
      .line(10, off, 10, 10 - off)
      .line(10 + off, 10, off, 10)
      .line(0, 10 + off, 0, -off)
      .outlines({ lastDigit: 0 })
    expect(set.count).toBe(1)
    expect(set.area[0]).toBeWithin(100, { absolute: 40 * off + 1e-13 })
  },
)

test('lines without length are left out with one note: 2 of them', () => {
  const set = new Drawn().lines(0, 0, 10, 10).line(3, 3, 3, 3).line(10, 10, 10, 10).outlines()
  expect(set.area[0]).toBe(100)
  expect(codesOf(set)).toEqual(['edges-without-length'])
  expect(set.findings[0].params.count).toBe(2)
})

test('no edges give no outlines and no findings', () => {
  const set = new Drawn().outlines()
  expect(set.count).toBe(0)
  expect(set.findings).toEqual([])
})

test('a side that stops 0.005 short and 0.003 off is bridged; swung to the other end, the outline would gain half 40 × 0.003', () => {
  const set = new Drawn()
    .line(0, 0, 40, 0)
    .line(40.005, -0.003, 100, -0.003)
    .line(100, -0.003, 100, 10)
    .line(100, 10, 0, 10)
    .line(0, 10, 0, 0)
    .outlines({ lastDigit: 0 })
  expect(set.findings[0].params.how).toBe('bridged by a straight edge')
  expect(set.repairs[0].area).toBeWithin(0.5 * 40 * 0.003, { relative: 1e-9 })
})
