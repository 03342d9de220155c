import type { Section } from '@/lib/section/types'

/** The figures of a section by which lists sort and filter. */
export const figureColumns = ({ area, mass, ix, iy, i1, i2, theta, circle }: Section) => ({
  area,
  mass: mass ?? null,
  ix,
  iy,
  i1,
  i2,
  theta,
  circle: 2 * circle.radius,
})
