import { axialAt, solveAxial } from './axial'
import type { Beam, BeamAnswer, BeamLoad, BeamResult, Piece, Reaction, Support } from './beam'
import { solveSymmetric } from './linear'
import { endForces, type Span, spanPieces, spanStiffness, stateFor } from './span'
import { faultOf } from './validate'

/** Unknowns of a node: v, u, and the turnings to its left and right, which a hinge tells apart. */
interface Node {
  at: number
  move: [number, number]
  turnLeft: [number, number]
  turnRight: [number, number]
}

/**
 * Solves a straight member of uniform stretches exactly: Euler–Bernoulli, or Timoshenko where a shear
 * compliance is given; bending in both planes coupled by Ixy; N, mm, MPa, signs as in `BeamLoad` and
 * `Piece`. One answer per set of loads, the factor shared. Never throws for a bad beam: the fault says
 * what and where, a mechanism also how it moves.
 */
export function solveBeam(beam: Beam, loadSets: readonly (readonly BeamLoad[])[]): BeamAnswer[] {
  const fault = loadSets.map((loads) => faultOf(beam, loads)).find((found) => found !== null)
  if (fault) return loadSets.map(() => ({ ok: false, fault }))
  const { nodes, count } = numbered(beam)
  const spans = spansBetween(beam, nodes)
  const k = new Float64Array(count * count)
  const unknowns = spans.map((_, i) => [...nodes[i].move, ...nodes[i].turnRight, ...nodes[i + 1].move, ...nodes[i + 1].turnLeft])
  spans.forEach((span, i) => {
    const stiffness = spanStiffness(span)
    unknowns[i].forEach((row, a) => {
      unknowns[i].forEach((column, b) => {
        k[row * count + column] += stiffness[8 * a + b]
      })
    })
  })
  const fixed = new Map<number, number>()
  for (const support of beam.supports) hold(support, nodeAt(nodes, support.at), fixed, k, count)

  const free = Array.from({ length: count }, (_, i) => i).filter((i) => !fixed.has(i))
  const reduced = new Float64Array(free.length ** 2)
  free.forEach((row, a) => {
    free.forEach((column, b) => {
      reduced[a * free.length + b] = k[row * count + column]
    })
  })
  const applied = loadSets.map((loads) => nodalLoads(loads, nodes, spans, unknowns, count))
  const sides = applied.map((forces) =>
    Float64Array.from(free, (row) => {
      let force = forces[row]
      fixed.forEach((movement, column) => {
        force -= k[row * count + column] * movement
      })
      return force
    }),
  )
  const solved = solveSymmetric(reduced, free.length, sides)
  if (!Array.isArray(solved)) return loadSets.map(() => mechanism(nodes, free, solved.free))
  return loadSets.map((loads, set) => {
    const movement = new Float64Array(count)
    fixed.forEach((value, i) => {
      movement[i] = value
    })
    free.forEach((i, a) => {
      movement[i] = solved[set][a]
    })
    const axial = solveAxial(beam, spans, loads)
    if ('fault' in axial) return { ok: false, fault: axial.fault }
    const states = spans.map((span, i) =>
      stateFor(
        span,
        loads,
        unknowns[i].map((unknown) => movement[unknown]),
      ),
    )
    const pieces = spans.flatMap((span, i) => spanPieces(span, loads, states[i]))
    const forces = new Float64Array(count)
    spans.forEach((span, i) => {
      endForces(span, loads, states[i]).forEach((force, a) => {
        forces[unknowns[i][a]] += force
      })
    })
    const direct = directLoads(loads, nodes, count)
    const reactions = beam.supports.map((support): Reaction => {
      const { move, turnLeft, turnRight } = nodeAt(nodes, support.at)
      const on = (unknown: number) => forces[unknown] - direct[unknown]
      const turning = (plane: 0 | 1) => on(turnLeft[plane]) + (turnRight[plane] === turnLeft[plane] ? 0 : on(turnRight[plane]))
      return {
        at: support.at,
        force: { y: on(move[0]), x: on(move[1]) },
        moment: { y: turning(0), x: turning(1) },
        axial: axialAt(axial, support),
      }
    })
    return { ok: true, result: { pieces: withAxial(pieces, axial.forces), reactions } satisfies BeamResult }
  })
}

function numbered(beam: Beam): { nodes: Node[]; count: number } {
  const marks = new Set([
    0,
    ...beam.stretches.map(({ to }) => to),
    ...beam.supports.map(({ at }) => at),
    ...beam.hinges.map(({ at }) => at),
  ])
  let count = 0
  const nodes = [...marks]
    .sort((a, b) => a - b)
    .map((at): Node => {
      const hinge = beam.hinges.find((candidate) => candidate.at === at)
      const next = (): number => count++
      const move: [number, number] = [next(), next()]
      const turnLeft: [number, number] = [next(), next()]
      const apart = (plane: 'vertical' | 'horizontal') =>
        hinge !== undefined && (hinge.releases === 'both' || hinge.releases === plane)
      return {
        at,
        move,
        turnLeft,
        turnRight: [apart('vertical') ? next() : turnLeft[0], apart('horizontal') ? next() : turnLeft[1]],
      }
    })
  return { nodes, count }
}

function spansBetween(beam: Beam, nodes: readonly Node[]): Span[] {
  return nodes.slice(0, -1).map(({ at }, i) => {
    const stretch = beam.stretches.find(({ to }) => at < to) ?? beam.stretches[beam.stretches.length - 1]
    return { from: at, to: nodes[i + 1].at, stiffness: stretch.stiffness }
  })
}

function nodeAt(nodes: readonly Node[], at: number): Node {
  return nodes.find((node) => node.at === at) ?? nodes[0]
}

function hold(support: Support, node: Node, fixed: Map<number, number>, k: Float64Array, count: number): void {
  const { kind, spring, settlement, holds = 'both' } = support
  for (const plane of [0, 1] as const) {
    if (holds !== 'both' && (holds === 'vertical') !== (plane === 0)) continue
    const axis = plane === 0 ? 'y' : 'x'
    const turns = [...new Set([node.turnLeft[plane], node.turnRight[plane]])]
    if (kind === 'spring') {
      k[node.move[plane] * (count + 1)] += spring?.along?.[axis] ?? 0
      for (const turn of turns) k[turn * (count + 1)] += spring?.turning?.[axis] ?? 0
    } else {
      fixed.set(node.move[plane], settlement?.[axis] ?? 0)
      if (kind === 'fixed') for (const turn of turns) fixed.set(turn, 0)
    }
  }
}

/** Forces and moments applied straight to nodes. */
function directLoads(loads: readonly BeamLoad[], nodes: readonly Node[], count: number): Float64Array {
  const out = new Float64Array(count)
  for (const load of loads) {
    const node = 'at' in load ? nodes.find(({ at }) => at === load.at) : undefined
    if (!node) continue
    if (load.kind === 'point') {
      out[node.move[0]] += load.force.y
      out[node.move[1]] += load.force.x
    } else if (load.kind === 'moment') {
      out[node.turnLeft[0]] += load.moment.y
      out[node.turnLeft[1]] += load.moment.x
    }
  }
  return out
}

/** Direct loads less the forces that hold each loaded span's ends still. */
function nodalLoads(
  loads: readonly BeamLoad[],
  nodes: readonly Node[],
  spans: readonly Span[],
  unknowns: readonly number[][],
  count: number,
): Float64Array {
  const out = directLoads(loads, nodes, count)
  spans.forEach((span, i) => {
    const still = new Array<number>(8).fill(0)
    endForces(span, loads, stateFor(span, loads, still)).forEach((force, a) => {
      out[unknowns[i][a]] -= force
    })
  })
  return out
}

function mechanism(nodes: readonly Node[], free: readonly number[], shape: Float64Array): BeamAnswer {
  const value = (unknown: number) => {
    const i = free.indexOf(unknown)
    return i < 0 ? 0 : shape[i]
  }
  const raw = nodes.map(({ at, move }) => ({ at, y: value(move[0]), x: value(move[1]) }))
  const greatest = Math.max(...raw.map(({ x, y }) => Math.hypot(x, y))) || 1
  const movement = raw.map(({ at, x, y }) => ({ at, x: x / greatest, y: y / greatest }))
  const furthest = movement.reduce((a, b) => (Math.hypot(b.x, b.y) > Math.hypot(a.x, a.y) ? b : a))
  const plane = Math.abs(furthest.y) >= Math.abs(furthest.x) ? 'vertical' : 'horizontal'
  const message = `The member can move freely in the ${plane} plane, most at ${furthest.at} mm. Add a support there or take a hinge out.`
  return { ok: false, fault: { code: 'mechanism', message, at: furthest.at, movement } }
}

/** Splits pieces where the axial force changes and fills it in. */
function withAxial(pieces: readonly Piece[], forces: readonly { from: number; to: number; force: number }[]): Piece[] {
  return pieces.map((piece) => {
    const middle = (piece.from + piece.to) / 2
    return { ...piece, axial: [forces.find(({ from, to }) => middle >= from && middle <= to)?.force ?? 0] }
  })
}
