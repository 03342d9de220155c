/** A round length (1, 2 or 5 times a power of ten) that takes at most `room` px at this scale, mm. */
export function scaleBarLength(scale: number, room: number): number {
  const most = room / scale
  const power = 10 ** Math.floor(Math.log10(most))
  const step = [5, 2, 1].find((factor) => factor * power <= most) ?? 1
  return step * power
}
