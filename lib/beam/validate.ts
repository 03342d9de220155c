import type { Beam, BeamFault, BeamLoad } from './beam'

const invalid = (message: string, at?: number): BeamFault => ({ code: 'invalid', message, at })
const numbersIn = (value: unknown): number[] =>
  typeof value === 'number' ? [value] : typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbersIn) : []

/** The first thing that makes a beam meaningless, as a sentence that says what and where; null where all is well. */
export function faultOf(beam: Beam, loads: readonly BeamLoad[]): BeamFault | null {
  if (beam.stretches.length === 0) return invalid('The member has no length. Give it at least one stretch.')
  for (const item of [...beam.stretches, ...beam.supports, ...beam.hinges, ...loads])
    if (numbersIn(item).some((value) => !Number.isFinite(value)))
      return invalid('A number is missing or too large to reckon with.')
  let end = 0
  for (const { to, stiffness } of beam.stretches) {
    if (!(to > end)) return invalid(`The stretch that ends at ${to} mm has no length.`, to)
    const { area, ix, iy, ixy, elasticModulus } = stiffness
    if (!(area > 0 && elasticModulus > 0 && ix > 0 && iy > 0 && ix * iy > ixy * ixy))
      return invalid(`The stretch that ends at ${to} mm has no stiffness: area, moduli and second moments must be positive.`, to)
    end = to
  }
  const outside = (at: number) => !(at >= 0 && at <= end)
  for (const { at } of beam.supports)
    if (outside(at)) return invalid(`The support at ${at} mm lies off the member (0 to ${end} mm).`, at)
  const places = beam.supports.map(({ at }) => at)
  for (const at of places)
    if (places.filter((other) => other === at).length > 1) return invalid(`Two supports stand at ${at} mm. Keep one.`, at)
  for (const { spring, at } of beam.supports)
    if (numbersIn(spring ?? 0).some((stiffness) => stiffness < 0))
      return invalid(`The spring at ${at} mm has a negative stiffness.`, at)
  for (const { at } of beam.hinges) {
    if (outside(at)) return invalid(`The hinge at ${at} mm lies off the member (0 to ${end} mm).`, at)
    if (at === 0 || at === end)
      return invalid(`A hinge at the end of the member (${at} mm) does nothing. Use a pinned support there.`, at)
    if (loads.some((load) => load.kind === 'moment' && load.at === at))
      return invalid(`A moment acts exactly on the hinge at ${at} mm. Move it to one side of the hinge.`, at)
  }
  for (const load of loads) {
    if ('at' in load) {
      if (outside(load.at)) return invalid(`A load at ${load.at} mm lies off the member (0 to ${end} mm).`, load.at)
    } else if (outside(load.from) || outside(load.to) || !(load.to > load.from))
      return invalid(`A load from ${load.from} to ${load.to} mm does not lie on the member (0 to ${end} mm).`, load.from)
  }
  return null
}
