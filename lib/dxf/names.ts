const SLOTS = 1024

/**
 * Numbers for the names in a file (kinds, layers, line types …), by their bytes without outer blanks.
 * Names are decoded only once all is read, because the code page may stand behind them.
 */
export class Names {
  /** the bytes of each name, one character a byte */
  readonly raw: string[] = []
  private readonly ids = new Map<string, number>()
  private readonly seenId = new Int32Array(SLOTS).fill(-1)
  private readonly seenFrom = new Uint32Array(SLOTS)
  private readonly seenTo = new Uint32Array(SLOTS)

  /** Beyond `most` names, further ones all get the number `beyond`. */
  constructor(
    private readonly bytes: Uint8Array,
    known: readonly string[] = [],
    private readonly most = Number.POSITIVE_INFINITY,
    private readonly beyond = 0,
  ) {
    for (const name of known) this.add(name)
  }

  idOf(valueFrom: number, valueTo: number): number {
    const { bytes } = this
    let from = valueFrom
    let to = valueTo
    while (from < to && bytes[from] <= 32) from++
    while (to > from && bytes[to - 1] <= 32) to--
    let hash = to - from
    for (let i = from; i < to; i++) hash = (Math.imul(hash, 31) + bytes[i]) | 0
    const slot = (hash ^ (hash >>> 10)) & (SLOTS - 1)
    if (this.seenId[slot] >= 0 && this.same(slot, from, to)) return this.seenId[slot]
    const id = this.add(bytesToText(bytes, from, to))
    this.seenId[slot] = id
    this.seenFrom[slot] = from
    this.seenTo[slot] = to
    return id
  }

  add(raw: string): number {
    const known = this.ids.get(raw)
    if (known !== undefined) return known
    if (this.raw.length >= this.most) return this.beyond
    this.ids.set(raw, this.raw.length)
    return this.raw.push(raw) - 1
  }

  private same(slot: number, from: number, to: number): boolean {
    const { bytes } = this
    const start = this.seenFrom[slot]
    if (this.seenTo[slot] - start !== to - from) return false
    for (let i = from, j = start; i < to; i++, j++) if (bytes[i] !== bytes[j]) return false
    return true
  }
}

/** One character a byte: a key for bytes, whatever their encoding. */
export function bytesToText(bytes: Uint8Array, from: number, to: number): string {
  let text = ''
  for (let i = from; i < to; i += 4096) text += String.fromCharCode(...bytes.subarray(i, Math.min(to, i + 4096)))
  return text
}
