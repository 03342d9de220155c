import { expect, test } from 'vitest'
import { snapperOf } from '@/components/board/snapper'
import { plateWithHole } from './shapes'

const snap = snapperOf(plateWithHole())

test('near a corner it snaps to the end of the edge, exactly', () => {
  expect(snap({ x: 10.3, y: 20.2 }, 1)).toEqual({ at: { x: 10, y: 20 }, kind: 'end', radius: null })
})

test('near the centre of the hole it snaps to the centre and knows the radius of 8', () => {
  expect(snap({ x: 30.2, y: 39.9 }, 1)).toEqual({ at: { x: 30, y: 40 }, kind: 'centre', radius: 8 })
})

test('far from everything the bare point is taken', () => {
  expect(snap({ x: 60, y: 50 }, 1)).toEqual({ at: { x: 60, y: 50 }, kind: null, radius: null })
})
