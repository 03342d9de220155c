import { describe, expect, it } from 'vitest'
import { readDimensionText } from '@/lib/dxf/dimensionText'
import { codesOf, drawn, entity, finding, fixture, line, read, table } from '../support/dxf'

type Group = [number, number | string]
const outline = line(0, 0, 50, 0)
const dimension = (type: number, ...rest: Group[]) => entity('DIMENSION', [70, type + 32], ...rest)
const linear = (...rest: Group[]) =>
  dimension(0, [10, 50], [20, 20], [11, 25], [21, 20], [13, 0], [23, 0], [14, 50], [24, 10], ...rest)
const only = (text: string, before = '') => read(drawn(outline + text, { before })).dimensions[0]

describe('DIMENSION', () => {
  it('linear: stored size, else from its points along its angle', () => {
    expect(only(linear([42, 50]))).toEqual({
      kind: 'linear',
      measured: 50,
      text: '',
      textValue: null,
      tolerance: null,
      layer: '0',
      a: { x: 0, y: 0 },
      b: { x: 50, y: 10 },
      angle: 0,
      at: { x: 25, y: 20 },
    })
    expect(only(linear())).toMatchObject({ measured: 50 })
    expect(only(linear([50, 90])).measured).toBeWithin(10, { absolute: 1e-13 })
  })

  it('aligned, radius, diameter, ordinate and angular', () => {
    expect(only(dimension(1, [10, 0], [20, 0], [13, 0], [23, 0], [14, 3], [24, 4]))).toMatchObject({
      kind: 'aligned',
      measured: 5,
    })
    expect(only(dimension(4, [10, 0], [20, 0], [15, 3], [25, 4]))).toMatchObject({ kind: 'radius', measured: 5 })
    expect(only(dimension(3, [10, -3], [20, 0], [15, 3], [25, 0]))).toMatchObject({ kind: 'diameter', measured: 6 })
    expect(only(dimension(6 + 64, [10, 1], [20, 1], [13, 8], [23, 3], [14, 9], [24, 9]))).toMatchObject({
      kind: 'ordinate',
      measured: 7,
    })
    expect(only(dimension(2, [42, Math.PI / 4], [10, 1], [20, 1]))).toMatchObject({ kind: 'angular', measured: 45 })
  })

  it('that says nothing of its size is no evidence', () => {
    expect(read(drawn(outline + dimension(2, [10, 1], [20, 1]))).dimensions).toEqual([])
  })

  it('is counted among what is no outline', () => {
    expect(read(drawn(outline + linear() + linear())).ignored).toEqual({ DIMENSION: 2 })
  })

  it('takes tolerances from its text, its own overrides, or its style', () => {
    expect(only(linear([1, '<>%%p0.1'])).tolerance).toEqual({ plus: 0.1, minus: 0.1 })
    const overrides: Group[] = [
      [1001, 'ACAD'],
      [1000, 'DSTYLE'],
      [1002, '{'],
      [1070, 71],
      [1070, 1],
      [1070, 47],
      [1040, 0.2],
      [1070, 48],
      [1040, 0.3],
      [1002, '}'],
    ]
    expect(only(linear(...overrides)).tolerance).toEqual({ plus: 0.2, minus: 0.3 })
    const style = table('DIMSTYLE', [
      [2, 'FITS'],
      [71, 1],
      [47, 0.05],
      [48, 0.02],
    ])
    expect(only(linear([3, 'Fits']), style).tolerance).toEqual({ plus: 0.05, minus: 0.02 })
    expect(only(linear([3, 'Other']), style).tolerance).toBeNull()
  })

  it('a text that contradicts the drawing beyond its own rounding is a warning with the ratio', () => {
    const says = (text: string) => read(drawn(outline + linear([42, 49.96], [1, text])))
    expect(codesOf(says('50.0'))).not.toContain('dimension-contradicts')
    expect(codesOf(says('50'))).not.toContain('dimension-contradicts')
    const { message, severity, at } = finding(says('50.00'), 'dimension-contradicts')
    expect(severity).toBe('warning')
    expect(message).toContain('says 50.00 and measures 49.96')
    expect(at).toEqual([25, 20])
    expect(finding(read(drawn(outline + linear([42, 50], [1, '1,968'], [5, 'A']))), 'dimension-contradicts').message).toContain(
      'ratio 0.03936',
    )
  })

  it('a linear factor in the style belongs to what the text shows', () => {
    const style = table('DIMSTYLE', [
      [2, 'S'],
      [144, 25.4],
    ])
    const drawing = read(drawn(outline + linear([3, 'S'], [42, 50], [1, '1270']), { before: style }))
    expect(codesOf(drawing)).not.toContain('dimension-contradicts')
  })

  it('a stored size that its points deny is a warning', () => {
    expect(finding(read(drawn(outline + linear([42, 55]))), 'dimension-stale').message).toContain(
      'stores 55, but its points are 50 apart',
    )
  })

  it('p21 has two', () => {
    expect(read(fixture('cases', 'p21.dxf')).dimensions).toHaveLength(2)
  })
})

describe('dimension texts', () => {
  it.each([
    ['50', 50, null],
    ['12,5', 12.5, null],
    ['12.5', 12.5, null],
    ['.5', 0.5, null],
    ['%%c50', 50, null],
    ['R2,5', 2.5, null],
    ['4x %%C6.6', 6.6, null],
    ['2 × R5', 5, null],
    ['50 H7', 50, null],
    ['M8', 8, null],
    ['45%%d', 45, null],
    ['50±0.1', 50, { plus: 0.1, minus: 0.1 }],
    ['50{\\H0.7x;\\S+0.2^-0.1;}', 50, { plus: 0.2, minus: 0.1 }],
    ['50 +0,2/+0,1', 50, { plus: 0.2, minus: -0.1 }],
    ['\\A1;{\\fArial|b0|i0;120}', 120, null],
    ['<>', null, null],
    ['<> H7', null, null],
    ['', null, null],
    ['A-A', null, null],
    ['3/4"', null, null],
    ["1'-6", null, null],
  ])('%s is %s', (text, value, tolerance) => {
    const read = readDimensionText(text)
    expect(read.value).toBe(value)
    expect(read.tolerance).toEqual(tolerance)
  })
})
