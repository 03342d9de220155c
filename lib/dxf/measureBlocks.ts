import type { BlockDefinition } from './blocks'
import type { ReadLimits } from './drawing'
import { type DxfCode, dxfFinding } from './findings'
import { bytesToText } from './names'
import type { Reading } from './reading'
import type { Sheet } from './sheet'

/** What a sheet comes to with all its blocks opened. */
interface Size {
  rows: number
  edges: number
  /** how deep blocks are nested in it; 0 without any */
  height: number
}

/** Edges that an entity may have on average before opening blocks is refused. */
const EDGES_PER_ENTITY = 5

/** For each sheet that is reached, the block that each of its placements shows: index into the blocks, −1 for none. */
export type Shown = Map<Sheet, Int32Array>

/**
 * Finds the block that each reachable placement shows and measures what opening them would give, before anything
 * is opened: arrays and nesting bombs cost nothing. A placement that shows no block gets a remark on its row.
 * Null (and a finding) where a limit would be passed.
 */
export function measureBlocks(
  reading: Reading,
  blocks: readonly BlockDefinition[],
  roots: readonly Sheet[],
  limits: ReadLimits,
): Shown | null {
  const measuring = new Measuring(reading, blocks, limits)
  let count = 0
  for (const root of roots) {
    const { rows, edges } = measuring.measure(root)
    count += Math.max(rows, edges / EDGES_PER_ENTITY)
  }
  const { findings } = reading
  const { entities, nesting } = limits
  if (measuring.tooDeep) {
    const block = reading.decode(measuring.tooDeep.name)
    findings.add('nested-too-deep', () => dxfFinding('nested-too-deep', { limit: nesting, setting: 'nesting', block }))
    return null
  }
  if (count > entities) {
    const params = { count: Math.ceil(count), limit: entities, setting: 'entities' }
    findings.add('too-many-after-opening', () => dxfFinding('too-many-after-opening', params))
    return null
  }
  return measuring.shown
}

class Measuring {
  readonly shown: Shown = new Map()
  tooDeep: Sheet | null = null
  private readonly sizes = new Map<Sheet, Size>()
  private readonly chain: Sheet[] = []
  /** by number of the block's name: index of its definition, or what keeps it from being shown */
  private readonly found: (number | DxfCode)[] = []
  private readonly byName = new Map<string, number[]>()

  constructor(
    private readonly reading: Reading,
    private readonly blocks: readonly BlockDefinition[],
    private readonly limits: ReadLimits,
  ) {
    blocks.forEach(({ sheet }, index) => {
      const key = this.key(sheet.name)
      const group = this.byName.get(key)
      if (group) group.push(index)
      else this.byName.set(key, [index])
    })
  }

  measure(sheet: Sheet): Size {
    const { chain, sizes, limits } = this
    const known = sizes.get(sheet)
    if (known) {
      if (chain.length + known.height > limits.nesting) this.tooDeep ??= sheet
      return known
    }
    const size = { rows: sheet.entities.count, edges: sheet.edges.count, height: 0 }
    if (chain.length > limits.nesting) {
      this.tooDeep ??= sheet
      return size
    }
    chain.push(sheet)
    const { placements } = sheet
    const shows = new Int32Array(placements.count).fill(-1)
    this.shown.set(sheet, shows)
    for (let i = 0; i < placements.count && !this.tooDeep; i++) {
      shows[i] = this.show(sheet, i)
      if (shows[i] < 0) continue
      const inner = this.measure(this.blocks[shows[i]].sheet)
      const times = placements.get(i, 'columns') * placements.get(i, 'rows')
      size.rows += times * (1 + inner.rows)
      size.edges += times * inner.edges
      size.height = Math.max(size.height, 1 + inner.height)
    }
    chain.pop()
    sizes.set(sheet, size)
    return size
  }

  /** Index of the block that placement i shows; −1, and a remark, where it shows none. */
  private show(sheet: Sheet, i: number): number {
    const name = sheet.placements.get(i, 'block')
    this.found[name] ??= this.find(name)
    const found = this.found[name]
    if (typeof found === 'string') return this.remark(sheet, i, found)
    const loop = this.chain.indexOf(this.blocks[found].sheet)
    if (loop < 0) return found
    const round = [...this.chain.slice(loop), this.blocks[found].sheet].map((s) => this.reading.decode(s.name))
    return this.remark(sheet, i, 'block-holds-itself', round.join(' → '))
  }

  private find(name: number): number | DxfCode {
    const { blocks, reading } = this
    const indices = this.byName.get(this.key(reading.blocks.raw[name])) ?? []
    if (indices.length === 0) return 'block-missing'
    const [index] = indices
    const block = blocks[index]
    if (indices.some((other) => !sameBytes(reading.cursor.bytes, block, blocks[other]))) return 'block-twice'
    if (block.external) return 'block-external'
    return Number.isNaN(block.base[0]) ? 'block-bad' : index
  }

  private remark(sheet: Sheet, i: number, code: DxfCode, chain = ''): -1 {
    const { reading } = this
    const { placements } = sheet
    const at = (key: Parameters<typeof placements.get>[1]) => placements.get(i, key)
    const handle = bytesToText(reading.cursor.bytes, at('handleFrom'), at('handleTo')).trim()
    const name = reading.decode(reading.blocks.raw[at('block')])
    reading.sheet = sheet
    reading.remark(at('row'), code, { kind: 'INSERT', handle, place: reading.place(at('line')), name, chain })
    reading.sheet = reading.root
    return -1
  }

  private key(raw: string): string {
    return this.reading.decode(raw).toUpperCase()
  }
}

function sameBytes(bytes: Uint8Array, one: BlockDefinition, other: BlockDefinition): boolean {
  if (one === other) return true
  if (one.to - one.from !== other.to - other.from) return false
  for (let i = one.from, j = other.from; i < one.to; i++, j++) if (bytes[i] !== bytes[j]) return false
  return true
}
