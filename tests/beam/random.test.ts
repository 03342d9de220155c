import { expect, test } from 'vitest'
import type { Beam, BeamLoad, BeamResult, Hinge, Support } from '@/lib/beam/beam'
import { extremes, quantityAt } from '@/lib/beam/extremes'
import { valueAt } from '@/lib/beam/polynomial'
import { solveBeam } from '@/lib/beam/solve'
import { random } from '../support/random'

const RUNS = Number(process.env.CAMPAIGN_RUNS ?? 300)

/**
 * A continuous unsymmetric member: two to five supports, up to two stretches, sometimes a hinge, a spring, an overhang.
 * No span is shorter than a fortieth of the member: digits go with the cube of the ratio of neighbouring spans.
 */
function anyBeam(next: () => number): { beam: Beam; length: number } {
  const between = (low: number, high: number) => low + next() * (high - low)
  const length = between(1000, 12000)
  const stiffness = () => {
    const [ix, iy] = [between(1e5, 1e8), between(1e5, 1e8)]
    return { area: between(500, 5000), ix, iy, ixy: between(-0.9, 0.9) * Math.sqrt(ix * iy), elasticModulus: between(5e4, 2.1e5) }
  }
  const count = 2 + Math.floor(next() * 4)
  const supports = Array.from(
    { length: count },
    (_, i): Support => ({ at: ((i + 0.1 + 0.5 * next()) * length) / count, kind: i === 0 ? 'fixed' : 'roller' }),
  )
  if (next() < 0.3)
    supports[count - 1] = {
      at: supports[count - 1].at,
      kind: 'spring',
      spring: { along: { x: between(10, 1e4), y: between(10, 1e4) } },
    }
  const hinges: Hinge[] = next() < 0.3 ? [{ at: (supports[0].at + supports[1].at) / 2, releases: 'both' }] : []
  const stretches =
    next() < 0.5
      ? [{ to: length, stiffness: stiffness() }]
      : [
          { to: supports[0].at + 0.75 * (supports[1].at - supports[0].at), stiffness: stiffness() },
          { to: length, stiffness: stiffness() },
        ]
  return { beam: { stretches, supports, hinges }, length }
}

function anyLoad(next: () => number, length: number): BeamLoad {
  const force = () => ({ x: (next() - 0.5) * 1e4, y: (next() - 0.5) * 1e4 })
  const line = () => ({ x: (next() - 0.5) * 20, y: (next() - 0.5) * 20 })
  const kind = next()
  if (kind < 0.4) return { kind: 'point', at: next() * length, force: force() }
  if (kind < 0.6) return { kind: 'moment', at: next() * length, moment: { x: (next() - 0.5) * 1e7, y: (next() - 0.5) * 1e7 } }
  const from = next() * length * 0.9
  return { kind: 'distributed', from, to: from + (0.05 + 0.95 * next()) * (length - from), start: line(), end: line() }
}

function results(beam: Beam, sets: BeamLoad[][]): BeamResult[] {
  return solveBeam(beam, sets).map((answer) => {
    if (!answer.ok) throw new Error(answer.fault.message)
    return answer.result
  })
}

const reach = (pieces: BeamResult['pieces'], plane: 'x' | 'y'): number => {
  const { least, greatest } = extremes(pieces, 'deflection', plane)
  return Math.max(-least.value, greatest.value)
}

test(`${RUNS} random members: two loads together give the sum of each alone`, () => {
  for (let seed = 1; seed <= RUNS; seed++) {
    const next = random(seed)
    const { beam, length } = anyBeam(next)
    const [one, other] = [anyLoad(next, length), anyLoad(next, length)]
    const [a, b, both] = results(beam, [[one], [other], [one, other]])
    const z = next() * length
    for (const quantity of ['deflection', 'moment'] as const) {
      const parts = [quantityAt(a.pieces, quantity, 'y', z), quantityAt(b.pieces, quantity, 'y', z)]
      const { least, greatest } = extremes(both.pieces, quantity, 'y')
      const scale = greatest.value - least.value
      expect(quantityAt(both.pieces, quantity, 'y', z), `seed ${seed}`).toBeWithin(parts[0] + parts[1], {
        absolute: 1e-8 * scale,
      })
    }
  }
})

test(`${RUNS} random members: the movement at B from a force at A equals that at A from the force at B (Maxwell and Betti, from memory)`, () => {
  for (let seed = 1; seed <= RUNS; seed++) {
    const next = random(seed)
    const { beam, length } = anyBeam(next)
    const [at, to] = [next() * length, next() * length]
    const up = (z: number): BeamLoad => ({ kind: 'point', at: z, force: { x: 0, y: 1000 } })
    const across = (z: number): BeamLoad => ({ kind: 'point', at: z, force: { x: 1000, y: 0 } })
    const [a, b] = results(beam, [[up(at)], [across(to)]])
    const sideways = quantityAt(a.pieces, 'deflection', 'x', to)
    const upwards = quantityAt(b.pieces, 'deflection', 'y', at)
    expect(sideways, `seed ${seed}`).toBeWithin(upwards, { absolute: 1e-8 * Math.max(1e-3, Math.abs(upwards)) })
  }
})

test(`${RUNS} random members: reactions and loads are in balance, forces and moments, in both planes`, () => {
  for (let seed = 1; seed <= RUNS; seed++) {
    const next = random(seed)
    const { beam, length } = anyBeam(next)
    const loads = Array.from({ length: 5 }, () => anyLoad(next, length))
    const [{ reactions }] = results(beam, [loads])
    for (const axis of ['x', 'y'] as const) {
      let [force, moment, size] = [0, 0, 1]
      const add = (z: number, f: number) => {
        force += f
        moment += z * f
        size += Math.abs(z * f)
      }
      for (const reaction of reactions) {
        add(reaction.at, reaction.force[axis])
        moment += reaction.moment[axis]
      }
      for (const load of loads) {
        if (load.kind === 'point') add(load.at, load.force[axis])
        if (load.kind === 'moment') moment += load.moment[axis]
        if (load.kind === 'distributed') {
          const width = load.to - load.from
          const [p, q] = [load.start[axis], load.end[axis]]
          add(load.from + width / 2, p * width)
          add(load.from + (2 * width) / 3, ((q - p) * width) / 2)
        }
      }
      expect(force, `seed ${seed}`).toBeWithin(0, { absolute: (1e-9 * size) / 1000 })
      expect(moment, `seed ${seed}`).toBeWithin(0, { absolute: 1e-9 * size })
    }
  }
})

test(`${RUNS} random members: the work of the loads is twice the strain energy`, () => {
  // ∫ MᵀD⁻¹M ds by six-point Gauss, exact for the polynomials of a piece
  const gauss = [
    [0.238619186083197, 0.467913934572691],
    [0.661209386466265, 0.360761573048139],
    [0.932469514203152, 0.17132449237917],
  ]
  for (let seed = 1; seed <= RUNS; seed++) {
    const next = random(seed)
    const { beam, length } = anyBeam(next)
    const load: BeamLoad = { kind: 'point', at: next() * length, force: { x: 3000, y: -5000 } }
    const [{ pieces, reactions }] = results(beam, [[load]])
    let energy = 0
    for (const piece of pieces) {
      const { stiffness } = beam.stretches.find(({ to }) => piece.from < to) ?? beam.stretches[0]
      const { ix, iy, ixy, elasticModulus: e } = stiffness
      const half = (piece.to - piece.from) / 2
      for (const [x, w] of gauss)
        for (const s of [half - x * half, half + x * half]) {
          const [my, mx] = [valueAt(piece.moment.y, s), valueAt(piece.moment.x, s)]
          energy += (w * half * (iy * my * my - 2 * ixy * my * mx + ix * mx * mx)) / (e * (ix * iy - ixy * ixy))
        }
    }
    beam.supports.forEach(({ spring }, i) => {
      if (spring?.along) energy += reactions[i].force.y ** 2 / spring.along.y + reactions[i].force.x ** 2 / spring.along.x
    })
    const greatest = Math.max(...(['x', 'y'] as const).map((plane) => reach(pieces, plane)))
    const work = 3000 * quantityAt(pieces, 'deflection', 'x', load.at) - 5000 * quantityAt(pieces, 'deflection', 'y', load.at)
    expect(work, `seed ${seed}`).toBeWithin(energy, { relative: 1e-9, absolute: 1e-9 * 8000 * greatest })
  }
})
