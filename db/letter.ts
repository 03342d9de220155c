const LETTERS = 'ABCDEFGHJKLMNPRTUVWY'

/** Revision letters A, B, C … without I, O, Q, S, X, Z; after Y come AA, AB … `position` counts from 0. */
export function letterOf(position: number): string {
  const rest = Math.floor(position / LETTERS.length)
  return (rest > 0 ? letterOf(rest - 1) : '') + LETTERS[position % LETTERS.length]
}
