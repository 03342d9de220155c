/** What one piece spans across an axis, and its area. */
export interface PieceSpan {
  min: number
  max: number
  area: number
}

/**
 * Where separate pieces leave a gap across an axis and the area on either side of it is equal (within `tolerance` × area), the
 * half-area line may lie anywhere in the gap, with the same plastic modulus: both ends of the gap. null where there is none.
 */
export function plasticGap(pieces: PieceSpan[], tolerance: number): [number, number] | null {
  const sorted = [...pieces].sort((a, b) => a.min - b.min)
  const whole = sorted.reduce((sum, { area }) => sum + area, 0)
  let below = 0
  let reach = Number.NEGATIVE_INFINITY
  for (const { min, max, area } of sorted) {
    if (min > reach && below > 0 && Math.abs(2 * below - whole) <= tolerance * whole) return [reach, min]
    reach = Math.max(reach, max)
    below += area
  }
  return null
}
