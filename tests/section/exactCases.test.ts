import { describe, expect, test } from 'vitest'
import { sectionOf } from '@/lib/section/section'
import type { Section } from '@/lib/section/types'
import { EXACT_SHAPES, type ExactShape } from '@/tests/support/exactCases'

function sectionFor(shape: ExactShape, density?: number): Section {
  const { section } = sectionOf(EXACT_SHAPES[shape], { lastDigit: 0, repairs: [], density })
  if (!section) throw new Error('no section')
  return section
}

/**
 * Closed forms of the textbooks (Timoshenko, Strength of Materials I; Young & Budynas, Roark's Formulas for Stress and Strain;
 * both from memory), each computed again with 40 digits (mpmath); printed to twelve digits.
 */
const CASES: Record<ExactShape, [a: number, xc: number, yc: number, ix: number, iy: number, ixy: number, theta: number | null]> =
  {
    R1: [6000, 30, 50, 5000000, 1800000, 0, 0],
    R2: [5000, 25, 50, 4166666.666667, 1041666.666667, 0, 0],
    R3: [5000, 50, 25, 1041666.666667, 4166666.666667, 0, 90],
    R4: [5000, -3.34936490539, 55.8012701892, 3385416.666667, 1822916.666667, -1353164.693413, 30],
    O1: [2827.43338823, 0, 0, 2898119.222937, 2898119.222937, 0, null],
    C1: [3926.99081699, 0, 21.2206590789, 685981.0040404, 2454369.260617, 0, 90],
    C2: [1963.49540849, 21.2206590789, 21.2206590789, 342990.5020202, 342990.5020202, -102944.1282883, 45],
    E1: [2513.27412287, 0, 0, 251327.4122872, 1005309.649149, 0, 90],
    T1: [4330.12701892, 50, 28.8675134595, 1804219.591218, 1804219.591218, 0, null],
    T2: [2700, 30, 20, 540000, 1215000, -405000, 64.902785546],
    U: [950, 14.3421052632, 50, 1432916.666667, 225005.4824561, 0, 0],
    T: [1904, 50, 75.512605042, 1577958.364146, 1003754.666667, 0, 0],
    L: [1300, 16.5384615385, 26.5384615385, 807756.4102564, 387756.4102564, -323076.9230769, 28.488066222],
    Z: [1128, 3, 50, 1667936, 416984, 620400, -22.383282218],
    I: [3080, 50, 100, 20982666.66667, 1669906.666667, 0, 0],
    B: [1174.79644737, 50, 30, 686817.4094756, 1525810.195446, 0, 90],
    K: [1308.996939, 31.8309886184, 0, 141540.7401657, 168414.2411465, 0, 90],
  }

type Moduli = [
  i1: number,
  i2: number,
  xTop: number,
  xBottom: number,
  yRight: number,
  yLeft: number,
  zx: number,
  atX: number,
  zy: number,
  atY: number,
]

const MODULI: Record<ExactShape, Moduli> = {
  R1: [5000000, 1800000, 100000, 100000, 60000, 60000, 150000, 0, 90000, 0],
  R2: [4166666.66667, 1041666.66667, 83333.3333333, 83333.3333333, 41666.6666667, 41666.6666667, 125000, 0, 62500, 0],
  R3: [4166666.66667, 1041666.66667, 41666.6666667, 41666.6666667, 83333.3333333, 83333.3333333, 62500, 0, 125000, 0],
  R4: [4166666.66667, 1041666.66667, 60669.1685545, 60669.1685545, 39075.9238962, 39075.9238962, 111260.208125, 0, 78125, 0],
  O1: [
    2898119.22294, 2898119.22294, 57962.3844587, 57962.3844587, 57962.3844587, 57962.3844587, 81333.3333333, 0, 81333.3333333, 0,
  ],
  C1: [
    2454369.26062, 685981.00404, 23835.8830357, 32326.0932419, 49087.3852123, 49087.3852123, 44247.6482465, -1.022021414,
    83333.3333333, 0,
  ],
  C2: [
    445934.630309, 240046.373732, 11917.9415179, 16163.046621, 11917.9415179, 16163.046621, 22123.8241233, -1.022021414,
    22123.8241233, -1.022021414,
  ],
  E1: [
    1005309.64915, 251327.412287, 12566.3706144, 12566.3706144, 25132.7412287, 25132.7412287, 21333.3333333, 0, 42666.6666667, 0,
  ],
  T1: [1804219.59122, 1804219.59122, 31250, 62500, 36084.3918244, 36084.3918244, 73223.3047034, -3.502216651, 72168.7836487, 0],
  T2: [1404691.85312, 350308.146876, 13500, 27000, 20250, 40500, 31632.4676319, -2.426406871, 47448.7014478, -3.639610307],
  U: [1432916.66667, 225005.482456, 28658.3333333, 28658.3333333, 6310.11685117, 15688.4556575, 33875, 0, 11368.75, -9.592105263],
  T: [1577958.36415, 1003754.66667, 64439.6174788, 20896.6220046, 20075.0933333, 20075.0933333, 37560.96, 14.96739496, 31408, 0],
  L: [
    983085.747609, 212427.072903, 15109.1127098, 30437.1980676, 8921.82890855, 23445.7364341, 27250, -11.53846154, 16218.75,
    -8.413461538,
  ],
  Z: [1923434.67987, 161485.320128, 33358.72, 33358.72, 8872, 8872, 39816, 0, 14100, 0],
  I: [20982666.6667, 1669906.66667, 209826.666667, 209826.666667, 33398.1333333, 33398.1333333, 238600, 0, 51620, 0],
  B: [
    1525810.19545, 686817.409476, 22893.9136492, 22893.9136492, 30516.2039089, 30516.2039089, 26602.8551755, 0, 37938.784123, 0,
  ],
  K: [
    168414.241146, 141540.740166, 5661.62960663, 5661.62960663, 9269.31232576, 5290.88942746, 11164.5496846, 0, 12284.622768,
    1.838353559,
  ],
}

/** Middles of cells of 1 mm. */
const cellsOf = (x0: number, x1: number, y0: number, y1: number): [number, number][] =>
  Array.from({ length: (x1 - x0) * (y1 - y0) }, (_, k) => [x0 + 0.5 + (k % (x1 - x0)), y0 + 0.5 + Math.floor(k / (x1 - x0))])

const shapes = Object.keys(EXACT_SHAPES) as ExactShape[]

describe('exact shapes', () => {
  test.each(shapes)('%s: area, centroid, second moments and angle at every printed digit', (shape) => {
    const s = sectionFor(shape)
    const [a, xc, yc, ix, iy, ixy, theta] = CASES[shape]
    const relative = 5e-12
    expect(s.area).toBeWithin(a, { relative })
    expect(s.centroid.x).toBeWithin(xc, { relative, absolute: 1e-12 })
    expect(s.centroid.y).toBeWithin(yc, { relative, absolute: 1e-12 })
    expect(s.ix).toBeWithin(ix, { relative })
    expect(s.iy).toBeWithin(iy, { relative })
    expect(s.ixy).toBeWithin(ixy, { relative, absolute: 1e-14 * s.ip })
    if (theta === null) expect(s.theta).toBeNull()
    else expect(s.theta).toBeWithin(theta, { absolute: 6e-10 })
  })

  test.each(shapes)('%s: principal moments, elastic and plastic moduli at every printed digit', (shape) => {
    const s = sectionFor(shape)
    const [i1, i2, xTop, xBottom, yRight, yLeft, zx, atX, zy, atY] = MODULI[shape]
    const relative = 1e-11
    expect(s.i1).toBeWithin(i1, { relative })
    expect(s.i2).toBeWithin(i2, { relative })
    expect(s.elastic.xTop).toBeWithin(xTop, { relative })
    expect(s.elastic.xBottom).toBeWithin(xBottom, { relative })
    expect(s.elastic.yRight).toBeWithin(yRight, { relative })
    expect(s.elastic.yLeft).toBeWithin(yLeft, { relative })
    expect(s.plastic.x).toBeWithin(zx, { relative })
    expect(s.plastic.y).toBeWithin(zy, { relative })
    expect(s.plastic.at.x).toBeWithin(atX, { absolute: 6e-9 })
    expect(s.plastic.at.y).toBeWithin(atY, { absolute: 6e-9 })
  })

  test.each([
    ['L', [17914.456567, 22314.868378, 7008.3385751, 7811.505277, 31126.680296, 13971.49953]],
    ['Z', [29992.516277, 29992.516277, 6047.3100583, 6047.3100583, 41845.541111, 11481.939429]],
    ['T2', [31827.957676, 22361.126936, 14907.417957, 11360.196888, 50776.171461, 25291.184781]],
    ['C2', [12612.936042, 12612.936042, 12008.64957, 7998.7345367, 24407.768234, 17910.955865]],
  ] as const)('%s: moduli about axes 1 and 2', (shape, [left1, right1, right2, left2, z1, z2]) => {
    const { elastic, plastic } = sectionFor(shape)
    const relative = 5e-11
    expect(elastic.axis1Left).toBeWithin(left1, { relative })
    expect(elastic.axis1Right).toBeWithin(right1, { relative })
    expect(elastic.axis2Right).toBeWithin(right2, { relative })
    expect(elastic.axis2Left).toBeWithin(left2, { relative })
    expect(plastic.axis1).toBeWithin(z1, { relative })
    expect(plastic.axis2).toBeWithin(z2, { relative })
  })

  test.each([
    ['L', 280, 0],
    ['U', 390, 0],
    ['C1', 257.07963267949, 0],
    ['E1', 193.768964410954, 0],
    ['B', 306.265482457437, 281.132741228718],
  ] as const)('%s: perimeters %d outside, %d inside', (shape, outside, inside) => {
    const { perimeter } = sectionFor(shape)
    expect(perimeter.outer).toBeWithin(outside, { relative: 1e-14 })
    expect(perimeter.inner).toBeWithin(inside, { relative: 1e-14 })
  })

  test('L weighs 3.51 kg/m at 2700 kg/m³ and 10.205 kg/m at 7850 kg/m³', () => {
    expect(sectionFor('L', 2700).mass).toBeWithin(3.51, { relative: 1e-14 })
    expect(sectionFor('L', 7850).mass).toBeWithin(10.205, { relative: 1e-14 })
    expect(sectionFor('L').mass).toBeUndefined()
  })

  test('a rectangle has the plastic shape factor 1.5, a disc’s tube 80/100 (1 − 0.8³)/(1 − 0.8⁴) · 16/3π', () => {
    expect(sectionFor('R1').plasticShape.x).toBeWithin(1.5, { relative: 1e-14 })
    // plastic 4(R³ − r³)/3 over elastic π(R⁴ − r⁴)/4R: Timoshenko, Strength of Materials II (from memory)
    expect(sectionFor('O1').plasticShape.x).toBeWithin(((16 / (3 * Math.PI)) * (1 - 0.8 ** 3)) / (1 - 0.8 ** 4), {
      relative: 1e-13,
    })
  })

  test('the free plastic moment of the Z about x is 0.61 of fy·Wpl,x, which needs a moment about y of 0.33 of it', () => {
    const { plastic, freePlastic } = sectionFor('Z')
    expect(freePlastic.x / plastic.x).toBeWithin(0.61, { absolute: 0.005 })
    // by duality the free modulus is the least of ∫|y − λx| dA over λ: summed here over cells of 1 mm about the centroid (3, 50)
    const cells = [...cellsOf(-47, -3, -50, -44), ...cellsOf(-3, 3, -50, 50), ...cellsOf(3, 47, 44, 50)]
    const spread = (lambda: number) => cells.reduce((sum, [x, y]) => sum + Math.abs(y - lambda * x), 0)
    const least = Math.min(...Array.from({ length: 400 }, (_, k) => spread(k / 100)))
    expect(freePlastic.x).toBeWithin(least, { relative: 2e-3 })
    // by hand: the two flange parts beyond the web, 264 mm² each, 25 mm from the middle
    expect(freePlastic.restrainedMyForX).toBeWithin(2 * 44 * 6 * 25, { relative: 1e-12 })
  })

  test('circumscribing circles: L through the toes and heel has radius 50, the semicircle 50, the ellipse 40', () => {
    expect(sectionFor('L').circle).toMatchObject({ x: 30, y: 40, radius: 50 })
    expect(sectionFor('C1').circle.radius).toBeWithin(50, { relative: 1e-13 })
    expect(sectionFor('E1').circle.radius).toBeWithin(40, { relative: 1e-13 })
  })
})
