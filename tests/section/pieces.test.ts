import { describe, expect, test } from 'vitest'
import { plasticGap } from '@/lib/section/plasticGap'
import { sectionOf } from '@/lib/section/section'
import { outer, rectangle, regionOfLoops } from '@/tests/support/region'

const inputs = { lastDigit: 0, repairs: [] }

describe('pieces that are not joined', () => {
  const flats = regionOfLoops([outer(rectangle(0, 0, 40, 10), 0), outer(rectangle(0, 30, 40, 10), 1)])

  test('two flats 40 × 10, 20 mm apart: Ix with Steiner 186666.67, without 6666.67, and a warning', () => {
    const { section, findings } = sectionOf(flats, inputs)
    expect(section?.pieces).toBe(2)
    expect(section?.ix).toBeWithin((2 * (40 * 1000)) / 12 + 2 * 400 * 225, { relative: 1e-14 })
    expect(section?.withoutSteiner?.ix).toBeWithin((2 * 40 * 1000) / 12, { relative: 1e-14 })
    expect(section?.withoutSteiner?.iy).toBeWithin(section?.iy ?? 0, { relative: 1e-14 })
    expect(section?.withoutSteiner?.ixy).toBeWithin(0, { absolute: 1e-9 })
    expect(findings.map(({ code }) => code)).toContain('pieces-not-joined')
    expect(section?.origin['withoutSteiner.ix'].kind).toBe('exact')
  })

  test('the plastic axis may lie anywhere in the gap of ±10 mm: the middle is shown, Z = 2 × 400 × 15', () => {
    const { section, findings } = sectionOf(flats, inputs)
    expect(section?.plastic.at.x).toBeWithin(0, { absolute: 1e-12 })
    expect(section?.plastic.atRange?.x?.[0]).toBeWithin(-10, { relative: 1e-12 })
    expect(section?.plastic.atRange?.x?.[1]).toBeWithin(10, { relative: 1e-12 })
    expect(section?.plastic.atRange?.y).toBeUndefined()
    expect(section?.plastic.x).toBeWithin(12000, { relative: 1e-12 })
    const gaps = findings.filter(({ code }) => code === 'plastic-axis-in-gap')
    expect(gaps.map(({ params }) => params)).toContainEqual({ axis: 'x', from: -10, to: 10 })
  })

  test('areas of 400 and 401 mm² leave no freedom when exact, and the gap when drawn to 0.05 mm', () => {
    const uneven = regionOfLoops([outer(rectangle(0, 0, 40, 10), 0), outer(rectangle(0, 30, 40.1, 10), 1)])
    expect(sectionOf(uneven, inputs).section?.plastic.atRange).toBeUndefined()
    expect(sectionOf(uneven, { ...inputs, lastDigit: 0.05 }).section?.plastic.atRange?.x).toBeDefined()
  })

  test('one piece has neither figures without Steiner terms nor a warning', () => {
    const { section, findings } = sectionOf(regionOfLoops([outer(rectangle(0, 0, 40, 10))]), inputs)
    expect(section).not.toHaveProperty('withoutSteiner')
    expect(findings).toEqual([])
  })

  test('three spans: a gap counts only where the areas on both sides are equal', () => {
    const spans = [
      { min: 0, max: 1, area: 2 },
      { min: 3, max: 4, area: 1 },
      { min: 6, max: 7, area: 1 },
    ]
    expect(plasticGap(spans, 1e-9)).toEqual([1, 3])
    expect(plasticGap([{ min: 0, max: 5, area: 1 }, ...spans], 1e-9)).toBeNull()
  })
})

describe('mass of several materials', () => {
  test('a steel flat and an aluminium flat of 400 mm² weigh 3.14 + 1.08 kg/m', () => {
    const steel = regionOfLoops([outer(rectangle(0, 0, 40, 10))])
    const aluminium = regionOfLoops([outer(rectangle(0, 10, 40, 10))])
    const { section } = sectionOf(regionOfLoops([outer(rectangle(0, 0, 40, 20))]), {
      ...inputs,
      parts: [
        { region: steel, density: 7850 },
        { region: aluminium, density: 2700 },
      ],
    })
    expect(section?.mass).toBeWithin(3.14 + 1.08, { relative: 1e-14 })
  })
})
