import type { BlockDefinition } from './blocks'
import type { ReadLimits } from './drawing'
import { type DxfCode, dxfFinding } from './findings'
import { bytesToText } from './names'
import type { Reading } from './reading'
import type { Placement, Sheet } from './sheet'

/** What a sheet comes to with all its blocks opened. */
interface Size {
  rows: number
  edges: number
  /** how deep blocks are nested in it; 0 without any */
  height: number
}

/** Edges that an entity may have on average before opening blocks is refused. */
const EDGES_PER_ENTITY = 5

/** The definition that each placement shows; null where it shows none. */
export type Resolve = (placement: Placement) => BlockDefinition | null

/**
 * Finds the block that each reachable placement shows and measures what opening them would give, before anything
 * is opened: arrays and nesting bombs cost nothing. A placement that shows no block gets a remark on its row.
 * Null (and a finding) where a limit would be passed.
 */
export function measureBlocks(
  reading: Reading,
  blocksOf: (name: number) => BlockDefinition[],
  roots: readonly Sheet[],
  limits: ReadLimits,
): Resolve | null {
  const shows = new Map<Placement, BlockDefinition | null>()
  const sizes = new Map<Sheet, Size>()
  const chain: Sheet[] = []
  let tooDeep: Sheet | null = null

  const find = (sheet: Sheet, placement: Placement): BlockDefinition | null => {
    const remark = (code: DxfCode, more = {}) => {
      const { bytes } = reading.cursor
      reading.sheet = sheet
      const where = { kind: 'INSERT', handle: bytesToText(bytes, ...placement.handle).trim(), line: placement.line }
      reading.remark(placement.row, code, { ...where, name: reading.decode(reading.blocks.raw[placement.block]), ...more })
      reading.sheet = reading.root
      return null
    }
    const found = blocksOf(placement.block)
    if (found.length === 0) return remark('block-missing')
    const [block] = found
    if (found.some((other) => !sameBytes(reading.cursor.bytes, block, other))) return remark('block-twice')
    if (block.external) return remark('block-external')
    if (Number.isNaN(block.base[0])) return remark('block-bad')
    const loop = chain.indexOf(block.sheet)
    if (loop >= 0) {
      const names = [...chain.slice(loop), block.sheet].map((s) => reading.decode(s.name))
      return remark('block-holds-itself', { chain: names.join(' → ') })
    }
    return block
  }

  const measure = (sheet: Sheet): Size => {
    const known = sizes.get(sheet)
    if (known) {
      if (chain.length + known.height > limits.nesting) tooDeep ??= sheet
      return known
    }
    const size = { rows: sheet.entities.count, edges: sheet.edges.count, height: 0 }
    if (chain.length > limits.nesting) {
      tooDeep ??= sheet
      return size
    }
    chain.push(sheet)
    for (const placement of sheet.placements) {
      if (tooDeep) break
      const block = find(sheet, placement)
      shows.set(placement, block)
      if (!block) continue
      const inner = measure(block.sheet)
      const times = placement.columns * placement.rows
      size.rows += times * (1 + inner.rows)
      size.edges += times * inner.edges
      size.height = Math.max(size.height, 1 + inner.height)
    }
    chain.pop()
    sizes.set(sheet, size)
    return size
  }

  let count = 0
  for (const root of roots) {
    const { rows, edges } = measure(root)
    count += Math.max(rows, edges / EDGES_PER_ENTITY)
  }
  const { entities, nesting } = limits
  if (tooDeep) {
    const block = reading.decode((tooDeep as Sheet).name)
    reading.findings.add('nested-too-deep', () => dxfFinding('nested-too-deep', { limit: nesting, setting: 'nesting', block }))
    return null
  }
  if (count > entities) {
    const params = { count: Math.ceil(count), limit: entities, setting: 'entities' }
    reading.findings.add('too-many-after-opening', () => dxfFinding('too-many-after-opening', params))
    return null
  }
  return (placement) => shows.get(placement) ?? null
}

function sameBytes(bytes: Uint8Array, one: BlockDefinition, other: BlockDefinition): boolean {
  if (one === other) return true
  if (one.to - one.from !== other.to - other.from) return false
  for (let i = one.from, j = other.from; i < one.to; i++, j++) if (bytes[i] !== bytes[j]) return false
  return true
}
