import { expect, test } from 'vitest'
import { choicesOf, type FlowAction, flow, startFlow } from '@/components/upload/flow/flow'
import { missingOf } from '@/components/upload/flow/missing'
import { stepsOf } from '@/components/upload/flow/makeUp'
import { compare, cures } from '@/components/upload/flow/size'
import type { OutlineView } from '@/lib/section/types'

const outline = (id: string, x: number, depth: number | null): OutlineView => ({
  id,
  layer: '0',
  edges: 4,
  area: 1,
  depth,
  at: [x, 0],
})
const outlines = [outline('o1', 10, 1), outline('o2', 0, 0), outline('o3', 20, 2), outline('o4', 30, null)]
const after = (...actions: FlowAction[]) => actions.reduce(flow, startFlow())

test('the default make-up lists outside first: depth 0 and 2 add, 1 cuts, a crossing outline is left out', () => {
  expect(stepsOf(null, outlines).map(({ at, does }) => [at[0], does])).toEqual([
    [0, 'add'],
    [10, 'cut'],
    [20, 'add'],
    [30, 'out'],
  ])
})

test('changing one role states the whole make-up, and two undos bring nesting back', () => {
  let state = after({ type: 'does', at: [20, 0], does: 'out', outlines }, { type: 'move', at: [10, 0], by: 1, outlines })
  expect(choicesOf(state).recipe.makeUp).toEqual([
    { at: [0, 0], does: 'add' },
    { at: [20, 0], does: 'out' },
    { at: [10, 0], does: 'cut' },
    { at: [30, 0], does: 'out' },
  ])
  state = flow(flow(state, { type: 'undo' }), { type: 'undo' })
  expect(choicesOf(state).recipe.makeUp).toBeNull()
  state = flow(state, { type: 'redo' })
  expect(choicesOf(state).recipe.makeUp).toHaveLength(4)
})

test('a step cannot move above the first', () => {
  const state = after({ type: 'move', at: [0, 0], by: -1, outlines })
  expect(choicesOf(state).recipe.makeUp?.[0].at).toEqual([0, 0])
})

test('an outline that a stated make-up does not name stands at its end, left out', () => {
  const stated = stepsOf([{ at: [0, 0], does: 'add' }], outlines.slice(0, 2))
  expect(stated).toEqual([
    { at: [0, 0], does: 'add' },
    { at: [10, 0], does: 'out' },
  ])
})

test('switching a layer off starts from the layers that the reader took', () => {
  const state = after(
    { type: 'layer', name: 'TEXT', on: false, taken: ['0', 'TEXT'] },
    { type: 'layer', name: 'AUX', on: true, taken: ['0', 'TEXT'] },
  )
  expect(choicesOf(state).recipe.layers).toEqual(['0', 'AUX'])
})

test('typed text is kept through undo', () => {
  const state = flow(after({ type: 'set', change: { unit: 'in' } }, { type: 'text', change: { note: 'from the order' } }), {
    type: 'undo',
  })
  expect(state.note).toBe('from the order')
  expect(choicesOf(state).recipe.unit).toBe('mm')
})

test('another detail of the sheet forgets make-up and confirmed size', () => {
  const state = after(
    { type: 'does', at: [0, 0], does: 'cut', outlines },
    { type: 'claim', claim: { by: 'typed', what: 'overall width', value: 60, drawn: 60 } },
    { type: 'set', change: { part: [[0, 0]] } },
  )
  expect(choicesOf(state).recipe.makeUp).toBeNull()
  expect(choicesOf(state).claim).toBeNull()
})

test('a die with 1.2 % shrinkage that becomes a finished profile has a factor of 1 again', () => {
  const die = after({ type: 'finished', finished: 'die', shrinkage: 1.012 })
  expect(choicesOf(die).recipe.shrinkage).toBe(1.012)
  expect(choicesOf(flow(die, { type: 'finished', finished: 'finished' })).recipe.shrinkage).toBe(1)
})

test('an arc accepted twice is recorded once, and declining takes it back', () => {
  const run = { from: [0, 0], through: [1, 1], to: [2, 0] } satisfies {
    from: [number, number]
    through: [number, number]
    to: [number, number]
  }
  const twice = after({ type: 'arc', run, accept: true }, { type: 'arc', run, accept: true })
  expect(choicesOf(twice).recipe.arcs).toEqual([run])
  const declined = flow(twice, { type: 'arc', run, accept: false })
  expect(choicesOf(declined)).toMatchObject({ recipe: { arcs: [] }, declined: [[0, 0]] })
})

test('60 mm known against 2.3622 drawn disagrees in mm and is explained by inches', () => {
  const claim = { by: 'typed', what: 'overall width', value: 60, drawn: 2.3622 } as const
  expect(compare(claim, { unit: 'mm', scale: 1, shrinkage: 1 }).agrees).toBe(false)
  expect(cures(claim, { unit: 'mm', scale: 1, shrinkage: 1 })).toEqual([{ kind: 'unit', unit: 'in' }])
  expect(compare(claim, { unit: 'in', scale: 1, shrinkage: 1 }).measured).toBeWithin(60, { absolute: 0.001 })
})

test('60 mm known against 60.72 drawn is explained by a shrinkage of 1.012', () => {
  const claim = { by: 'typed', what: 'overall width', value: 60, drawn: 60.72 } as const
  expect(cures(claim, { unit: 'mm', scale: 1, shrinkage: 1 })).toEqual([{ kind: 'shrinkage', shrinkage: 1.012 }])
})

test('120 mm known against 12 drawn is explained by centimetres or a scale of 1:10', () => {
  const claim = { by: 'drawn', what: 'drawn dimension 120', value: 120, drawn: 12 } as const
  expect(cures(claim, { unit: 'mm', scale: 1, shrinkage: 1 })).toEqual([
    { kind: 'unit', unit: 'cm' },
    { kind: 'scale', scale: 10 },
  ])
})

test('nothing may be saved before a dimension agrees, it is said what is drawn, and a new profile has a title', () => {
  const target = (title: string) => ({ kind: 'new', jobId: 'j', title, materialId: null }) as const
  const claim = (drawn: number): FlowAction => ({
    type: 'claim',
    claim: { by: 'typed', what: 'overall width', value: 60, drawn },
  })
  const finished: FlowAction = { type: 'finished', finished: 'finished' }
  expect(missingOf(choicesOf(startFlow()), target(''), false)).toEqual([
    'the drawing gives a section',
    'a known dimension is confirmed',
    'it is said what is drawn',
    'the profile has a title',
  ])
  expect(missingOf(choicesOf(after(claim(61), finished)), target('T'), true)).toEqual(['the known dimension agrees'])
  expect(missingOf(choicesOf(after(claim(60), finished)), target('T'), true)).toEqual([])
})
