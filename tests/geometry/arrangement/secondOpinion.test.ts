import GeometryFactory from 'jsts/org/locationtech/jts/geom/GeometryFactory.js'
import GeoJSONReader from 'jsts/org/locationtech/jts/io/GeoJSONReader.js'
import OverlayOp from 'jsts/org/locationtech/jts/operation/overlay/OverlayOp.js'
import { expect, test } from 'vitest'
import { jetAt, newJet } from '@/lib/geometry/evaluate'
import { random } from '@/tests/support/random'
import { perimeterOf, VARIANTS, varied } from './campaign'
import { arrangementOf, where } from './combine'
import { KINDS, pairOf } from './pairs'
import { type Shape, tableOf } from './shapes'

const CHORDS = 96

/** The shape with each curve cut into chords; the greatest distance from it is then near length · π² / (8 · 96²). */
function flattened(shape: Shape): [number, number][] {
  const { edges } = tableOf([shape])
  const ring: [number, number][] = []
  const jet = newJet()
  for (let i = 0; i < edges.count; i++) {
    const steps = edges.kind[i] === 0 ? 1 : CHORDS
    ring.push([edges.ends[4 * i], edges.ends[4 * i + 1]])
    for (let s = 1; s < steps; s++) {
      const { x, y } = jetAt(edges, i, s / steps, jet)
      ring.push([x, y])
    }
  }
  return [...ring, ring[0]]
}

// JSTS 2.12.1, a port of the JTS Topology Suite: overlay of polygons, a general-purpose geometry library
test(`60 pairs of ten kinds in five kinds of edge have the areas that JSTS finds on chords, to chord height × perimeter`, () => {
  const reader = new GeoJSONReader(new GeometryFactory())
  const wrong: string[] = []
  for (let seed = 1; seed <= 60; seed++) {
    const next = random(seed)
    const variant = VARIANTS[Math.floor(seed / 10) % VARIANTS.length]
    const pair = varied(pairOf(KINDS[seed % KINDS.length], next), variant, next)
    const [p, q] = pair.map((shape) => reader.read({ type: 'Polygon', coordinates: [flattened(shape)] }))
    const both = arrangementOf(pair)
    const rows: [string, number, number][] = [
      ['union', where(both, ([a, b]) => a || b).area, OverlayOp.union(p, q).getArea()],
      ['common', where(both, ([a, b]) => a && b).area, OverlayOp.intersection(p, q).getArea()],
      ['rest', where(both, ([a, b]) => a && !b).area, OverlayOp.difference(p, q).getArea()],
    ]
    const length = perimeterOf(pair[0]) + perimeterOf(pair[1])
    for (const [what, ours, theirs] of rows) {
      if (!(Math.abs(ours - theirs) <= (length * length * Math.PI ** 2) / (8 * CHORDS ** 2)))
        wrong.push(`seed ${seed} ${what}: ${ours} against ${theirs}`)
    }
  }
  expect(wrong).toEqual([])
})
