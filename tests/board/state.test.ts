import { expect, test } from 'vitest'
import { type BoardAction, boardReducer, initialBoard } from '@/components/board/boardState'
import { createHover } from '@/components/board/hover'
import { measured } from '@/components/board/measure'

const after = (...actions: BoardAction[]) => actions.reduce(boardReducer, initialBoard)
const point = (x: number, y: number): BoardAction => ({ do: 'point', at: { x, y } })

test('a third point starts a new measurement, and undo takes it back point by point', () => {
  const three = after({ do: 'tool', tool: 'measure' }, point(0, 0), point(3, 4), point(9, 9))
  expect(three.points).toEqual([{ x: 9, y: 9 }])
  expect(boardReducer(three, { do: 'undo' }).points).toEqual([
    { x: 0, y: 0 },
    { x: 3, y: 4 },
  ])
})

test('a drag of the own axis is one step to undo', () => {
  const axis = (y: number, step: boolean): BoardAction => ({ do: 'axis', axis: { through: { x: 0, y }, angle: 0 }, step })
  const dragged = after(axis(1, true), axis(1, true), axis(2, false), axis(3, false))
  expect(dragged.axis?.through.y).toBe(3)
  expect(boardReducer(dragged, { do: 'undo' }).axis?.through.y).toBe(1)
})

test('Escape first drops the points, then the tool', () => {
  const measuring = after({ do: 'tool', tool: 'measure' }, point(0, 0))
  const dropped = boardReducer(measuring, { do: 'escape' })
  expect([dropped.tool, dropped.points.length]).toEqual(['measure', 0])
  expect(boardReducer(dropped, { do: 'escape' }).tool).toBe('look')
})

test('from (0, 0) to (3, 4) it is 5 mm at 53.13°, and a point to itself has no angle', () => {
  const { distance, dx, dy, angle } = measured({ x: 0, y: 0 }, { x: 3, y: 4 })
  expect([distance, dx, dy]).toEqual([5, 3, 4])
  expect(angle).toBeWithin(53.13010235415598, { absolute: 1e-12 })
  expect(measured({ x: 1, y: 1 }, { x: 1, y: 1 }).angle).toBe(null)
})

test('the hover store tells its listeners once for the same figure', () => {
  const store = createHover()
  let told = 0
  const stop = store.subscribe(() => told++)
  store.set({ kind: 'figure', key: 'ix' })
  store.set({ kind: 'figure', key: 'ix' })
  stop()
  store.set(null)
  expect(told).toBe(1)
})
