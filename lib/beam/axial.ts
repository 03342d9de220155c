import type { Beam, BeamFault, BeamLoad, Reaction } from './beam'
import { solveSymmetric } from './linear'
import type { Span } from './span'

/** Axial force in each span between the marks, tension positive, and the axial reactions. */
export interface AxialAnswer {
  /** from, to and the constant force between */
  forces: { from: number; to: number; force: number }[]
  reactions: Map<number, number>
}

/**
 * The member along its axis: N = EA·(w' − α·rise), N' = 0 between loads. Pinned and fixed supports hold it.
 * Without any axial load and without a support along the axis it simply stays where it is.
 */
export function solveAxial(beam: Beam, spans: readonly Span[], loads: readonly BeamLoad[]): AxialAnswer | { fault: BeamFault } {
  const acting = loads.filter((load) => load.kind === 'axial' || (load.kind === 'temperature' && load.rise !== 0))
  const marks = new Set(spans.flatMap(({ from, to }) => [from, to]))
  for (const load of acting) {
    if (load.kind === 'axial') marks.add(load.at)
    else if (load.kind === 'temperature') marks.add(load.from).add(load.to)
  }
  const nodes = [...marks].sort((a, b) => a - b)
  const bars = nodes.slice(0, -1).map((from, i) => ({ from, to: nodes[i + 1], force: 0 }))
  if (acting.length === 0) return { forces: bars, reactions: new Map() }

  const n = nodes.length
  const k = new Float64Array(n * n)
  const side = new Float64Array(n)
  const properties = bars.map((bar) => {
    const { stiffness } = spans.find((span) => bar.from < span.to) ?? spans[spans.length - 1]
    const rise = acting.reduce(
      (sum, load) => sum + (load.kind === 'temperature' && load.from <= bar.from && load.to >= bar.to ? load.rise : 0),
      0,
    )
    const ea = stiffness.elasticModulus * stiffness.area
    return { stiffness: ea / (bar.to - bar.from), free: ea * (stiffness.expansion ?? 0) * rise }
  })
  properties.forEach(({ stiffness, free }, i) => {
    k[i * n + i] += stiffness
    k[(i + 1) * n + i + 1] += stiffness
    k[i * n + i + 1] -= stiffness
    k[(i + 1) * n + i] -= stiffness
    side[i] -= free
    side[i + 1] += free
  })
  for (const load of acting) if (load.kind === 'axial') side[nodes.indexOf(load.at)] += load.force

  const held = new Set<number>()
  const springs = new Map<number, number>()
  for (const support of beam.supports) {
    const i = nodes.indexOf(support.at)
    if (support.kind === 'pinned' || support.kind === 'fixed') held.add(i)
    else if (support.kind === 'spring' && support.spring?.axial) springs.set(i, support.spring.axial)
  }
  springs.forEach((stiffness, i) => {
    k[i * n + i] += stiffness
  })
  const free = nodes.map((_, i) => i).filter((i) => !held.has(i))
  const reduced = new Float64Array(free.length ** 2)
  free.forEach((i, a) => {
    free.forEach((j, b) => {
      reduced[a * free.length + b] = k[i * n + j]
    })
  })
  const solved = solveSymmetric(reduced, free.length, [Float64Array.from(free, (i) => side[i])])
  if (!Array.isArray(solved)) {
    const message = 'Nothing holds the member along its axis, but it is loaded along it. Make one support pinned or fixed.'
    return { fault: { code: 'mechanism', message } }
  }
  const movement = new Float64Array(n)
  free.forEach((i, a) => {
    movement[i] = solved[0][a]
  })
  bars.forEach((bar, i) => {
    bar.force = properties[i].stiffness * (movement[i + 1] - movement[i]) - properties[i].free
  })
  const reactions = new Map<number, number>()
  for (const i of [...held, ...springs.keys()]) {
    const left = i > 0 ? bars[i - 1].force : 0
    const right = i < bars.length ? bars[i].force : 0
    const applied = acting.reduce((sum, load) => sum + (load.kind === 'axial' && load.at === nodes[i] ? load.force : 0), 0)
    reactions.set(nodes[i], left - right - applied)
  }
  return { forces: bars, reactions }
}

/** The axial reaction at a support, 0 where none. */
export const axialAt = (answer: AxialAnswer, { at }: Pick<Reaction, 'at'>): number => answer.reactions.get(at) ?? 0
