import { expect, test } from 'vitest'
import { ARC } from '@/lib/geometry/edges'
import type { MakeUpStep } from '@/lib/geometry/recipe'
import { codes, combined, measured, metalOf } from './setOf'
import { arc, asBeziers, circle, lineTo, mapped, polygon, rectangle, rounded, type Shape } from './shapes'

const step = (x: number, y: number, does: MakeUpStep['does'], material?: string): MakeUpStep => ({ at: [x, y], does, material })
const PI = Math.PI

// areas, pieces and perimeters of fixtures/cases p18, p19, p20, p24 are those of fixtures/cases/expected.json
test('three plates and a round bar that overlap are one piece of 7977.0796 mm² (case p18)', () => {
  const answer = combined(
    [rectangle(0, 0, 200, 15), rectangle(95, 10, 10, 300), rectangle(20, 305, 160, 12), circle(100, 317, 10)],
    { makeUp: [step(0, 5, 'add'), step(95, 100, 'add'), step(20, 310, 'add'), step(100, 327, 'add')] },
  )
  const { area, outer, inner } = measured(metalOf(answer))
  expect(area).toBeWithin(7977.07963267949, { relative: 1e-12 })
  expect(outer).toBeWithin(1345.4159265358978, { relative: 1e-12 })
  expect(inner).toBe(0)
  expect(answer.region?.pieces).toBe(1)
  expect(answer.roles).toEqual(['add', 'add', 'add', 'add'])
})

test('a plate cut by a circle and a slot across its edge has 4625.8631 mm² (case p19)', () => {
  const slot: Shape = [
    ...polygon([110, 30], [90, 30], [90, 20], [110, 20]).filter((_, i) => i === 0),
    arc({ x: 90, y: 25 }, 5, PI / 2, PI, { x: 90, y: 30 }, { x: 90, y: 20 }),
    lineTo({ x: 90, y: 20 }, { x: 110, y: 20 }),
    lineTo({ x: 110, y: 20 }, { x: 110, y: 30 }),
  ]
  const answer = combined([rectangle(0, 0, 100, 50), circle(60, 54, 15), slot], {
    makeUp: [step(0, 25, 'add'), step(60, 39, 'cut'), step(110, 25, 'cut')],
  })
  const { area, outer } = measured(metalOf(answer))
  expect(area).toBeWithin(4625.863126542996, { relative: 1e-12 })
  expect(outer).toBeWithin(335.82020460719184, { relative: 1e-12 })
})

test('a round bar in common with a turned rectangle, bored, has 1946.2386 mm² and one hole (case p20)', () => {
  const box = polygon(
    [-19.322722287114424, -25.74650274144144],
    [29.917665363495978, -17.064093858094925],
    [22.277145546151047, 26.26744727444223],
    [-26.963242104459354, 17.585038391095715],
  )
  const answer = combined([circle(0, 0, 30), box, circle(0, 0, 8)], {
    makeUp: [step(30, 0, 'add'), step(26.097405454823512, 4.601676708173654, 'common'), step(8, 0, 'cut')],
  })
  const { area, outer, inner } = measured(metalOf(answer))
  expect(area).toBeWithin(1946.238644244393, { relative: 1e-12 })
  expect(outer).toBeWithin(176.27123014159207, { relative: 1e-12 })
  expect(inner).toBeWithin(50.26548245743669, { relative: 1e-12 })
  expect(answer.roles).toEqual(['add', 'common', 'cut'])
})

test('a thermal break has one outer loop round shells and strips, and a region per material (case p24)', () => {
  const answer = combined(
    [
      rectangle(0, 0, 60, 40),
      rounded(2, 2, 56, 36, 1),
      rectangle(0, 64, 60, 40),
      rounded(2, 66, 56, 36, 1),
      rectangle(12, 40, 2, 24),
      rectangle(46, 40, 2, 24),
      rounded(10, 6, 30, 20, 4),
      rounded(12, 8, 26, 16, 2),
    ],
    {
      makeUp: [
        step(0, 20, 'add', 'aluminium'),
        step(2, 20, 'cut'),
        step(0, 84, 'add', 'aluminium'),
        step(2, 84, 'cut'),
        step(12, 52, 'add', 'polyamide'),
        step(46, 52, 'add', 'polyamide'),
        step(10, 16, 'add', 'steel'),
        step(12, 16, 'cut'),
      ],
    },
  )
  const { area, outer, inner } = measured(metalOf(answer))
  expect(area).toBeWithin(1039.4159265358978, { relative: 1e-12 })
  expect(outer).toBeWithin(469.1327412287184, { relative: 1e-12 })
  expect(inner).toBeWithin(557.1327412287184, { relative: 1e-12 })
  expect(answer.region?.pieces).toBe(2)
  const areas = Object.fromEntries(answer.parts.map(({ material, region }) => [material, measured(region).area]))
  expect(areas.aluminium).toBeWithin(769.7168146928204, { relative: 1e-12 })
  expect(areas.polyamide).toBeWithin(96, { relative: 1e-12 })
  expect(areas.steel).toBeWithin(173.69911184307753, { relative: 1e-12 })
})

test('a plate with a half-disc bump keeps 24² + 2π mm² with a circle inside whose rightmost point is the foot of the bump', () => {
  // where rays along an axis through the extremes of arcs go wrong
  const bump: Shape = [
    lineTo({ x: 0, y: 0 }, { x: 12, y: 0 }),
    arc({ x: 12, y: 2 }, 2, -PI / 2, PI, { x: 12, y: 0 }, { x: 12, y: 4 }),
    lineTo({ x: 12, y: 4 }, { x: 12, y: 24 }),
    lineTo({ x: 12, y: 24 }, { x: -12, y: 24 }),
    lineTo({ x: -12, y: 24 }, { x: -12, y: 0 }),
    lineTo({ x: -12, y: 0 }, { x: 0, y: 0 }),
  ]
  const answer = combined([bump, circle(9, 4, 3)], { makeUp: [step(-12, 12, 'add'), step(6, 4, 'add')] })
  expect(measured(metalOf(answer)).area).toBeWithin(24 * 24 + 2 * PI, { relative: 1e-12 })
  const cut = combined([bump, circle(9, 4, 3)], { makeUp: [step(-12, 12, 'add'), step(6, 4, 'cut')] })
  expect(measured(metalOf(cut)).area).toBeWithin(24 * 24 + 2 * PI - 9 * PI, { relative: 1e-12 })
})

test('without a make-up a plate, a hole and an island are even–odd: 100 − 36 + 4 mm² in two pieces', () => {
  const answer = combined([rectangle(0, 0, 10, 10), rectangle(2, 2, 6, 6), rectangle(4, 4, 2, 2)])
  const region = metalOf(answer)
  expect(measured(region).area).toBe(68)
  expect(region.pieces).toBe(2)
  expect(answer.roles).toEqual(['add', 'cut', 'add'])
  expect(Array.from(region.hole)).toEqual([0, 1, 0])
  expect(region.piece[1]).toBe(region.piece[0])
  expect(answer.findings).toEqual([])
})

test('outlines that cross have no default: an error asks for a make-up and gives no region', () => {
  const answer = combined([rectangle(0, 0, 10, 10), rectangle(5, 5, 10, 10)])
  expect(answer.region).toBeNull()
  expect(answer.findings.map(({ code, severity }) => [code, severity])).toEqual([['make-up-needed', 'error']])
  expect(answer.findings[0].message).toContain('2 outlines cross one another, those at (0, 5), (10, 15)')
})

test('a round hole that touches the plate in one point is a hole with zero wall, 100 − 4π mm²', () => {
  const region = metalOf(combined([rectangle(0, 0, 10, 10), circle(5, 8, 2, 0.3)]))
  expect(measured(region).area).toBeWithin(100 - 4 * PI, { relative: 1e-12 })
  expect(Array.from(region.hole).sort()).toEqual([0, 1])
  expect(region.pieces).toBe(1)
})

test('two squares that touch in a corner are two pieces; joined by a sliver of overlap they are one', () => {
  const makeUp = [step(0, 5, 'add'), step(20, 15, 'add')]
  expect(metalOf(combined([rectangle(0, 0, 10, 10), rectangle(10, 10, 10, 10)], { makeUp })).pieces).toBe(2)
  expect(metalOf(combined([rectangle(0, 0, 10, 10), rectangle(9.9, 9.9, 10, 10)], { makeUp })).pieces).toBe(1)
})

test('two plates that share an edge are one piece without the edge, and a warning says so', () => {
  const answer = combined([rectangle(0, 0, 10, 10), rectangle(10, 2, 5, 4)])
  expect(measured(metalOf(answer)).outer).toBe(50)
  expect(codes(answer)).toContain('outlines-abut')
})

test('a cut that leaves two plates touching in a point splits the loop there: two pieces, 100 − 50 mm²', () => {
  const square = rectangle(0, 0, 10, 10)
  const left = polygon([0, 0], [5, 5], [0, 10])
  const right = polygon([10, 0], [10, 10], [5, 5])
  const region = metalOf(combined([square, left, right], { makeUp: [step(5, 0, 'add'), step(2, 2, 'cut'), step(8, 2, 'cut')] }))
  expect(measured(region).area).toBe(50)
  expect(region.pieces).toBe(2)
})

test('steps have an order: cut before add leaves the later metal, add before cut does not', () => {
  const shapes = [rectangle(0, 0, 10, 10), circle(10, 5, 3), rectangle(8, 4, 6, 2)]
  const plate = step(0, 5, 'add')
  const hole = step(10, 8, 'cut')
  const rib = step(14, 5, 'add')
  const area = (makeUp: MakeUpStep[]) => measured(metalOf(combined(shapes, { makeUp }))).area
  const half = 4.5 * PI
  expect(area([plate, hole, rib])).toBeWithin(100 - half + 12, { relative: 1e-12 })
  const ribInHole = Math.sqrt(8) + 9 * Math.asin(1 / 3)
  expect(area([plate, rib, hole])).toBeWithin(108 - half - ribInHole, { relative: 1e-12 })
  expect(area([hole, plate, rib])).toBeWithin(108, { relative: 1e-12 })
})

test('an outline not named, or outside the part, is left out', () => {
  const shapes = [rectangle(0, 0, 10, 10), rectangle(2, 2, 2, 2), rectangle(20, 0, 5, 5)]
  const named = combined(shapes, { makeUp: [step(0, 5, 'add')] })
  expect(measured(metalOf(named)).area).toBe(100)
  expect(named.roles).toEqual(['add', 'out', 'out'])
  const part = combined(shapes, { part: [[20, 2]] })
  expect(measured(metalOf(part)).area).toBe(25)
  expect(part.roles).toEqual(['out', 'out', 'add'])
})

test('a part that begins with an inner outline counts depth among what is taken: it adds', () => {
  const answer = combined([rectangle(0, 0, 10, 10), rectangle(2, 2, 4, 4)], { part: [[2, 4]] })
  expect(measured(metalOf(answer)).area).toBe(16)
})

test('arcs of the result keep centre and radius of the drawing to the last bit', () => {
  const shapes = [rounded(0, 0, 30.1, 16.7, 3.3), circle(29.9, 8.2, 4.1)]
  const region = metalOf(combined(shapes, { makeUp: [step(0, 8, 'add'), step(34, 8.2, 'cut')] }))
  const carriers = shapes.flat().flatMap((e) => (e.kind === ARC ? [[e.centre.x, e.centre.y, e.radius].join()] : []))
  let arcs = 0
  for (let i = 0; i < region.edges.count; i++) {
    if (region.edges.kind[i] !== ARC) continue
    arcs++
    expect(carriers).toContain(region.edges.shapes.slice(region.edges.shape[i], region.edges.shape[i] + 3).join())
  }
  expect(arcs).toBeGreaterThanOrEqual(5)
})

test('neighbouring edges of every loop share their end to the last bit, for all kinds of edge', () => {
  const pair = [rounded(0, 0, 30, 16, 3), circle(28, 8, 5)]
  const makeUp = (by: number) => [step(0, 8 * by, 'add'), step(33, 8 * by, 'cut')]
  const kinds: [Shape[], number][] = [
    [pair, 1],
    [pair.map((s) => mapped(s, [1, 0, 0, 0.6, 0, 0])), 0.6],
    [pair.map((s) => asBeziers(s, false)), 1],
    [pair.map((s) => asBeziers(s, true)), 1],
  ]
  for (const [shapes, by] of kinds) {
    const { edges, loopStart } = metalOf(combined(shapes, { makeUp: makeUp(by) }))
    for (let k = 0; k + 1 < loopStart.length; k++) {
      for (let i = loopStart[k]; i < loopStart[k + 1]; i++) {
        const j = i + 1 < loopStart[k + 1] ? i + 1 : loopStart[k]
        expect(edges.ends.slice(4 * i + 2, 4 * i + 4)).toEqual(edges.ends.slice(4 * j, 4 * j + 2))
      }
    }
  }
})

test('two materials that overlap ask a question with its area; the later step holds; an answer makes it a note', () => {
  const shapes = [rectangle(0, 0, 10, 10), rectangle(8, 0, 10, 10)]
  const makeUp = [step(0, 5, 'add', 'aluminium'), step(18, 5, 'add', 'steel')]
  const answer = combined(shapes, { makeUp })
  const found = answer.findings.find(({ code }) => code === 'material-overlap')
  expect(found?.params.area).toBeWithin(20, { relative: 1e-12 })
  expect(answer.parts.map(({ region }) => measured(region).area)).toEqual([80, 100])
  const answered = combined(shapes, { makeUp, bonds: [{ at: [9, 5], is: 'bonded' }] })
  expect(codes(answered)).toContain('overlap-answered')
  expect(codes(answered)).not.toContain('material-overlap')
})

test('a slit of 5 µm along a tube is kept and reported with width and length', () => {
  const wall = polygon(
    [0, 0],
    [20, 0],
    [20, 20],
    [10.0025, 20],
    [10.0025, 18],
    [18, 18],
    [18, 2],
    [2, 2],
    [2, 18],
    [9.9975, 18],
    [9.9975, 20],
    [0, 20],
  )
  const answer = combined([wall])
  const slit = answer.findings.find(({ code }) => code === 'slit')
  expect(slit?.params.gap).toBeWithin(0.005, { relative: 1e-9 })
  expect(slit?.params.length).toBeWithin(2, { relative: 0.01 })
  expect(measured(metalOf(answer)).area).toBeWithin(400 - 256 - 0.01, { relative: 1e-12 })
})

test('two pieces 0.02 mm apart ask whether they are bonded; a bond there answers', () => {
  const shapes = [rectangle(0, 0, 10, 10), rectangle(10.02, 0, 10, 10)]
  expect(codes(combined(shapes))).toEqual(['gap'])
  expect(codes(combined(shapes, { bonds: [{ at: [10.01, 5], is: 'contact' }] }))).toEqual(['gap-answered'])
})

test('a sliver below the duplicate tolerance stays in the area and is reported with its width', () => {
  const shapes = [rectangle(0, 0, 10, 10), rectangle(20, 0, 10, 5e-6)]
  const answer = combined(shapes)
  expect(codes(answer)).toContain('sliver')
  expect(measured(metalOf(answer)).area).toBeWithin(100 + 5e-5, { relative: 1e-12 })
})

test('a make-up point far from every outline is a warning with its distance', () => {
  const answer = combined([rectangle(0, 0, 10, 10)], { makeUp: [step(15, 5, 'add')] })
  expect(answer.findings.map(({ code, params }) => [code, params.distance])).toEqual([['make-up-point-off', 5]])
})

test('a part point 490 mm from the nearest outline is an error: no figure is guessed from it', () => {
  const answer = combined([rectangle(0, 0, 10, 10)], { part: [[500, 5]] })
  const found = answer.findings.map(({ code, severity, params }) => [code, severity, params.distance])
  expect(found).toContainEqual(['part-not-found', 'error', 490])
})

test('a make-up that cuts everything away is an error, not an empty region', () => {
  const answer = combined([rectangle(0, 0, 10, 10), rectangle(-1, -1, 20, 20)], {
    makeUp: [step(0, 5, 'add'), step(-1, 5, 'cut')],
  })
  expect(answer.region).toBeNull()
  expect(codes(answer)).toEqual(['no-metal'])
})

test('a hole that breaks through the edge by 1e-8 … 1e-5 mm changes topology only with a finding, and area by the displacement', () => {
  for (let e = -8; e <= -5; e++) {
    const by = 10 ** e
    const answer = combined([rectangle(0, 0, 40, 24), circle(20.3, 20 + by, 4)], {
      makeUp: [step(0, 12, 'add'), step(20.3, 16 + by, 'cut')],
    })
    const region = metalOf(answer)
    const holes = region.hole.reduce((sum, h) => sum + h, 0)
    expect([by, holes === 1 || answer.findings.length > 0]).toEqual([by, true])
    expect(measured(region).area).toBeWithin(960 - 16 * PI, { absolute: by * 8 * PI + 1e-7 })
  }
})

test('plates that overlap by 1e-6 mm are one piece, with a finding that gives the width', () => {
  const answer = combined([rectangle(0, 0, 10, 10), rectangle(10 - 1e-6, 2, 10, 6)], {
    makeUp: [step(0, 5, 'add'), step(20 - 1e-6, 5, 'add')],
  })
  expect(metalOf(answer).pieces).toBe(1)
  const found = answer.findings.find(({ code }) => code === 'overlap-thin')
  expect(found?.params.width).toBeWithin(1e-6, { relative: 0.01 })
  expect(found?.params.length).toBeWithin(6, { relative: 1e-6 })
})

test('parts of a make-up that lie apart from all crossings are taken as drawn, edge for edge', () => {
  const far = rounded(100, 0, 20, 10, 2)
  const answer = combined([rectangle(0, 0, 10, 10), circle(10, 5, 3), far], {
    makeUp: [step(0, 5, 'add'), step(10, 8, 'cut'), step(110, 0, 'add')],
  })
  const { edges, loopStart } = metalOf(answer)
  const loop = Array.from(loopStart.keys()).find((k) => edges.ends[4 * loopStart[k]] > 99)
  expect(loop).toBeDefined()
  expect(loopStart[(loop ?? 0) + 1] - loopStart[loop ?? 0]).toBe(far.length)
  expect(answer.steps.map(({ does }) => does)).toEqual(['add', 'cut', 'add'])
})
