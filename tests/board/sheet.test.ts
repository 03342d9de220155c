import { expect, test } from 'vitest'
import { axisRows } from '@/components/sheet/axisRows'
import { eventSentence } from '@/components/sheet/eventSentence'
import { roleOf } from '@/components/sheet/makeUp'
import { contributions, totalPlusMinus } from '@/components/sheet/plusMinus'
import { shareSummary } from '@/components/sheet/shareWords'
import { writingOf } from '@/components/sheet/writing'
import { aboutAxis } from '@/lib/section/axis'
import { bundlesOf } from '@/lib/section/bundles'
import { answerWith } from './answer'
import { plateWithHole, rectangle, zShape } from './shapes'

const team = { lengthUnit: 'mm', digits: 5, symbols: 'en', axes: 'xy' } as const

test('half of Ix of a rectangle lies beyond h/2·∛½ in 20.63 % of the metal; the near half gives 12.5 %', () => {
  const { half, nearHalf } = shareSummary(bundlesOf(rectangle(20, 100)), 0, 'x')
  expect(half.distance).toBeWithin(50 * Math.cbrt(0.5), { relative: 1e-8 })
  expect(half.metal).toBeWithin(1 - Math.cbrt(0.5), { relative: 1e-8 })
  expect(half.share).toBeWithin(0.5, { relative: 1e-8 })
  expect(nearHalf).toBeWithin(0.125, { relative: 1e-7 })
})

test('the largest cause of a ± stands first, causes of nothing are left out, and the ± is their sum', () => {
  const plusMinus = { digits: 0.002, repairs: 0, numerics: 0.5 }
  expect(contributions(plusMinus)).toEqual([
    { word: 'the numerics', value: 0.5 },
    { word: "the drawing's last digit", value: 0.002 },
  ])
  expect(totalPlusMinus(plusMinus)).toBe(0.502)
  expect(totalPlusMinus(undefined)).toBe(0)
})

test('by nesting an even depth adds and an odd depth cuts; an outline that crosses another is not said', () => {
  const answer = answerWith(plateWithHole(), [
    { id: 'o1', at: [10, 40] },
    { id: 'o2', at: [38, 40] },
  ])
  expect([roleOf(answer, 'o1'), roleOf(answer, 'o2')]).toEqual(['add', 'cut'])
  const crossing = { ...answer, outlines: answer.outlines.map((outline) => ({ ...outline, depth: null })) }
  expect(roleOf(crossing, 'o1')).toBe(null)
})

test('what the engine tells of an outline counts; where a person stated the make-up and it does not tell, nothing is guessed', () => {
  const at: [number, number] = [10, 40]
  const answer = answerWith(plateWithHole(), [{ id: 'o1', at }], { makeUp: [{ at, does: 'common' }] })
  expect(roleOf(answer, 'o1')).toBe(null)
  const told = { ...answer, outlines: answer.outlines.map((outline) => ({ ...outline, does: 'common' as const })) }
  expect(roleOf(told, 'o1')).toBe('common')
})

test('a drawing writes 50 mm and 90°, not 50.000 mm and 90.000°, and a true minus', () => {
  const { length, angle } = writingOf(team)
  expect(length(50)).toBe('50 mm')
  expect(length(87.29893)).toBe('87.299 mm')
  expect(length(100)).toBe('100 mm')
  expect(length(-0.5)).toBe('\u22120.5 mm')
  expect(angle(90)).toBe('90°')
})

test('in inches 25.4 mm reads 1 in, and y–z names the axes y, z, u, v', () => {
  const { length, names } = writingOf({ ...team, lengthUnit: 'in', axes: 'yz' })
  expect(length(25.4)).toBe('1 in')
  expect(names).toEqual({ x: 'y', y: 'z', axis1: 'u', axis2: 'v' })
})

test('about an axis on the edge of a 20 × 100 rectangle Ia is bh³/3 and there is no fibre on its right', () => {
  const rows = axisRows(aboutAxis(bundlesOf(rectangle(20, 100)), { x: 0, y: 0, angle: 0 }))
  expect(rows[0].value).toBeWithin((20 * 100 ** 3) / 3, { relative: 1e-12 })
  expect(rows.map(({ word }) => word)).not.toContain('to the fibre on its right')
})

test('about axis 1 of a Z the second moment is I1 and the product is nil', () => {
  const { section } = answerWith(zShape())
  const { x, y } = section?.centroid ?? { x: 0, y: 0 }
  const rows = axisRows(aboutAxis(bundlesOf(zShape()), { x, y, angle: section?.theta ?? 0 }))
  const value = (word: string) => rows.find((row) => row.word === word)?.value ?? Number.NaN
  expect(value('about the axis')).toBeWithin(section?.i1 ?? 0, { relative: 1e-9 })
  expect(value('product')).toBeWithin(0, { absolute: 1e-9 * (section?.ip ?? 0) })
})

const happened = {
  id: 'a'.repeat(26),
  at: '2026-12-01T12:00:00.000Z',
  actor: { id: 'b'.repeat(26), name: 'Ada Brandt' },
  verb: 'profile.changed',
  sentence: 'changed the profile',
  subjectType: 'profile' as const,
  subjectId: 'c'.repeat(26),
  before: null,
  after: null,
}

test('a changed title reads from what to what, a changed material by its name only', () => {
  const before = { title: 'Bar', materialId: 'd'.repeat(26) }
  const after = { title: 'Frame bar', materialId: 'e'.repeat(26) }
  const sentence = eventSentence({ ...happened, before, after }, () => null)
  expect(sentence).toBe('Ada Brandt changed the profile: title from “Bar” to “Frame bar”, material.')
})

test('an event about a revision names its letter, and what nobody did was done by the server', () => {
  const stored = {
    ...happened,
    actor: null,
    sentence: 'stored the second opinions on a revision',
    subjectType: 'revision' as const,
  }
  expect(eventSentence(stored, () => 'B')).toBe('The server stored the second opinions on revision B.')
})
