import { cutBezier, type Homogeneous } from './bezierPieces'

const SAMPLES = 32
/** Speed at a cusp against the piece's greatest. */
const STILL = 1e-9
/** No piece has more cusps one in another; one as small as its own rounding may seem to. */
const MOST_CUTS = 5

/**
 * Cuts a piece where its point stands still (a zero of the hodograph inside the piece: a cusp), so that every piece
 * has a tangent throughout. A piece whose control polygon always goes forward along its chord has none.
 */
export function cutAtCusps(piece: Homogeneous, cuts = MOST_CUTS): Homogeneous[] {
  if (cuts === 0 || goesForward(piece)) return [piece]
  let top = 0
  for (let i = 0; i <= SAMPLES; i++) top = Math.max(top, speed(piece, i / SAMPLES))
  if (top === 0) return [piece]
  for (let i = 1; i < SAMPLES; i++) {
    const here = speed(piece, i / SAMPLES)
    if (here > speed(piece, (i - 1) / SAMPLES) || here > speed(piece, (i + 1) / SAMPLES)) continue
    const t = slowest(piece, (i - 1) / SAMPLES, (i + 1) / SAMPLES)
    if (t > 1e-6 && t < 1 - 1e-6 && speed(piece, t) <= STILL * top)
      return cutBezier(piece, t).flatMap((half) => cutAtCusps(half, cuts - 1))
  }
  return [piece]
}

function goesForward(piece: Homogeneous): boolean {
  const last = piece.length - 3
  const x = (k: number) => piece[k] / piece[k + 2]
  const y = (k: number) => piece[k + 1] / piece[k + 2]
  const dx = x(last) - x(0)
  const dy = y(last) - y(0)
  for (let k = 0; k < last; k += 3) if ((x(k + 3) - x(k)) * dx + (y(k + 3) - y(k)) * dy <= 0) return false
  return true
}

/** |dP/dt| at t. */
function speed(piece: Homogeneous, t: number): number {
  const d = piece.slice()
  const degree = piece.length / 3 - 1
  for (let r = 0; r < degree - 1; r++) for (let k = 0; k < 3 * (degree - r); k++) d[k] = (1 - t) * d[k] + t * d[k + 3]
  const w = (1 - t) * d[2] + t * d[5]
  const wx = (1 - t) * d[0] + t * d[3]
  const wy = (1 - t) * d[1] + t * d[4]
  const dw = degree * (d[5] - d[2])
  return Math.hypot((degree * (d[3] - d[0]) * w - wx * dw) / (w * w), (degree * (d[4] - d[1]) * w - wy * dw) / (w * w))
}

/** Golden-section search for the least speed. */
function slowest(piece: Homogeneous, from: number, to: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2
  let [a, b] = [from, to]
  let c = b - ratio * (b - a)
  let d = a + ratio * (b - a)
  let atC = speed(piece, c)
  let atD = speed(piece, d)
  for (let i = 0; i < 80; i++) {
    if (atC < atD) {
      ;[b, d, atD] = [d, c, atC]
      c = b - ratio * (b - a)
      atC = speed(piece, c)
    } else {
      ;[a, c, atC] = [c, d, atD]
      d = a + ratio * (b - a)
      atD = speed(piece, d)
    }
  }
  return (a + b) / 2
}
