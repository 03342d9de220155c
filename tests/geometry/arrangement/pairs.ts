import { circle, mapped, polygon, rectangle, rounded, type Shape, turnAndMove } from './shapes'

export const KINDS = [
  'random',
  'integer grid',
  'shared edge',
  'tangent outside',
  'tangent inside',
  'coincident arcs',
  'vertex touch',
  'identical',
  'nested',
  'touching, turned and moved',
] as const
export type Kind = (typeof KINDS)[number]

/** A pair of shapes, 2 to 40 units, that meet in the way the kind says. */
export function pairOf(kind: Kind, next: () => number): [Shape, Shape] {
  const between = (low: number, high: number) => low + next() * (high - low)
  const whole = (low: number, high: number) => Math.floor(between(low, high + 1))
  const any = (): Shape => {
    const [w, h] = [between(2, 40), between(2, 40)]
    const [x, y] = [between(-20, 20), between(-20, 20)]
    const pick = next()
    if (pick < 0.3) return circle(x, y, w / 2, pick < 0.15 ? 0 : between(0, 6))
    if (pick < 0.6) return rounded(x, y, w, h, (Math.min(w, h) / 2) * between(0.1, 0.9))
    return rounded(x, y, Math.max(w, h), Math.min(w, h), Math.min(w, h) / 2)
  }
  const turned = (s: Shape) => mapped(s, turnAndMove(between(0, 6), between(-5, 5), between(-5, 5)))
  switch (kind) {
    case 'random':
      return [turned(any()), turned(any())]
    case 'integer grid': {
      const one = (): Shape => {
        const [x, y, w, h] = [whole(0, 10), whole(0, 10), 2 * whole(1, 6), 2 * whole(1, 6)]
        const r = whole(1, Math.min(w, h) / 2)
        const pick = whole(0, 2)
        return pick === 0 ? circle(x, y, r) : pick === 1 ? rectangle(x, y, w, h) : rounded(x, y, w, h, r)
      }
      return [one(), one()]
    }
    case 'shared edge': {
      const [w, h, k] = [between(4, 30), between(4, 30), between(2, 20)]
      const from = next() < 0.5 ? 0 : between(-0.5, 0.7) * h
      const to = next() < 0.3 ? h - from : between(0.3, 0.9) * h
      return [rectangle(0, 0, w, h), next() < 0.5 ? rectangle(w, from, k, to) : rectangle(w - k, from, k, to)]
    }
    case 'tangent outside': {
      const [r, R, t] = [between(1, 15), between(1, 15), between(0, 6.3)]
      if (next() < 0.5) return [circle(0, 0, r), circle((r + R) * Math.cos(t), (r + R) * Math.sin(t), R)]
      return [rounded(0, 0, 20, 12, 3), circle(between(4, 16), 12 + r, r)]
    }
    case 'tangent inside': {
      const [r, t] = [between(1, 7), between(0, 6.3)]
      if (next() < 0.5) return [circle(0, 0, 12), circle((12 - r) * Math.cos(t), (12 - r) * Math.sin(t), r)]
      return [rounded(0, 0, 30, 16, 3), circle(between(8, 22), 16 - r, r)]
    }
    case 'coincident arcs': {
      const [w, h, r] = [between(10, 30), between(10, 30), between(1, 4)]
      const pick = next()
      if (pick < 0.4) return [rounded(0, 0, w, h, r), circle(w - r, h - r, r)]
      if (pick < 0.7) return [rounded(0, 0, w, h, r), rounded(w - 8, h - 9, 8, 9, r)]
      return [rounded(0, 0, w, 2 * r, r), rounded(w - 2 * r - 3, 0, 2 * r + 3, 2 * r, r)]
    }
    case 'vertex touch': {
      const [w, h] = [between(3, 20), between(3, 20)]
      if (next() < 0.5) return [rectangle(0, 0, w, h), rectangle(w, h, between(2, 9), between(2, 9))]
      const inside: Shape = polygon([w, h / 2], [w - 1, h / 2 + 1], [w - 2.5, h / 2 + 0.2], [w - 1.2, h / 2 - 1])
      return [rectangle(0, 0, w, h), inside]
    }
    case 'identical': {
      const s = any()
      const t = s.map((e) => ({ ...e }))
      return [s, next() < 0.5 ? t : [...t.slice(1), ...t.slice(0, 1)]]
    }
    case 'nested':
      return [rounded(0, 0, 30, 24, between(1, 11)), circle(between(10, 20), between(10, 14), between(1, 8))]
    case 'touching, turned and moved': {
      const touching: Kind[] = [
        'shared edge',
        'tangent outside',
        'tangent inside',
        'coincident arcs',
        'vertex touch',
        'identical',
      ]
      const [a, b] = pairOf(touching[whole(0, 5)], next)
      const by = turnAndMove(between(0, 6.3), between(-1000, 1000), between(-1000, 1000))
      return [mapped(a, by), mapped(b, by)]
    }
  }
}
