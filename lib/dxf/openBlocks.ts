import { type Affine, after } from './affine'
import type { BlockDefinition } from './blocks'
import { type EntityColumns, FROZEN_INSERT, HATCH_PATTERN } from './drawing'
import { pushEntity } from './entityTable'
import type { Shown } from './measureBlocks'
import type { Naming } from './naming'
import { placeEdges } from './placeEdges'
import { BY_BLOCK, BY_LAYER, type Reading } from './reading'
import type { Placements, Sheet } from './sheet'

/** What a placed entity takes from the inserts around it: indices of `Drawing`. */
export interface Surroundings {
  layer: number
  lineType: number
  space: number
  flags: number
  block: number
  insert: number
}

/** Names that programs give to the blocks of hatch patterns up to R12 (from memory). */
const IS_PATTERN = /^\*X\d/i

/** Puts copies of blocks into the root, entity by entity, in world coordinates. */
export class BlockOpener {
  inserts = 0
  /** times each kind was met and not turned into edges */
  readonly ignored = new Map<number, number>()
  readonly blocks: string[] = []
  private readonly blockIndex = new Map<BlockDefinition, number>()

  constructor(
    private readonly reading: Reading,
    private readonly naming: Naming,
    private readonly definitions: readonly BlockDefinition[],
    private readonly shown: Shown,
  ) {}

  /** Opens all inserts of a sheet whose own rows are in the root already, from row `first` on. */
  openAll(sheet: Sheet, map: Affine, first: number): void {
    const { entities } = this.reading.root
    const { placements } = sheet
    const shows = this.shown.get(sheet)
    for (let k = 0; shows && k < placements.count; k++) {
      if (shows[k] < 0) continue
      const block = this.definitions[shows[k]]
      const around = this.surroundings(entities, first + placements.get(k, 'row'), block)
      const [columns, rows] = [placements.get(k, 'columns'), placements.get(k, 'rows')]
      for (let j = 0; j < rows; j++) {
        for (let i = 0; i < columns; i++) {
          this.inserts++
          const own = around.insert === 0 ? { ...around, insert: this.inserts } : around
          this.place(block, after(map, placedMap(placements, k, i, j, block.base)), own)
        }
      }
    }
  }

  private surroundings(entities: EntityColumns, row: number, block: BlockDefinition): Surroundings {
    const layer = entities.layer[row]
    const outer = entities.block[row]
    return {
      layer,
      lineType: entities.lineType[row],
      space: entities.space[row],
      flags:
        entities.flags[row] |
        (this.naming.layers[layer].frozen ? FROZEN_INSERT : 0) |
        (IS_PATTERN.test(block.sheet.name) ? HATCH_PATTERN : 0),
      block: outer === 0 ? this.numberOf(block) : outer,
      insert: entities.insert[row],
    }
  }

  /** Puts one copy of a block's content into the root, and opens what it places in turn. */
  place(block: BlockDefinition, map: Affine, around: Surroundings): void {
    const { sheet } = block
    const { root } = this.reading
    const first = this.placeRows(sheet.entities, around)
    const far = placeEdges(root.edges, sheet.edges, map, first)
    if (far >= 0) this.reading.remark(first + far, 'placed-too-far', { kind: 'INSERT', handle: '', place: '', block: sheet.name })
    this.count(sheet)
    this.openAll(sheet, map, first)
  }

  count(sheet: Sheet): void {
    for (const [kind, n] of sheet.ignored) this.ignored.set(kind, (this.ignored.get(kind) ?? 0) + n)
  }

  private placeRows(from: EntityColumns, around: Surroundings): number {
    const into = this.reading.root.entities
    const { layerOf, zero } = this.naming
    const first = into.count
    for (let r = 0; r < from.count; r++) {
      const own = layerOf[from.layer[r]]
      const layer = own === zero ? around.layer : own
      const lineType = this.lineType(from.lineType[r], layer, around.lineType)
      const row = pushEntity(into, from.kind[r], layer, lineType, around.space, from.flags[r] | around.flags)
      into.block[row] = around.block
      into.insert[row] = around.insert
      into.closed[row] = from.closed[r]
      into.remark[row] = from.remark[r]
    }
    return first
  }

  /** Answers "by layer" and "by block". */
  lineType(raw: number, layer: number, around: number): number {
    const { layerLineType, lineTypeOf } = this.naming
    if (raw === BY_LAYER || lineTypeOf[raw] === -1) return layerLineType[layer]
    return raw === BY_BLOCK || lineTypeOf[raw] === -2 ? around : lineTypeOf[raw]
  }

  private numberOf(block: BlockDefinition): number {
    const known = this.blockIndex.get(block)
    if (known !== undefined) return known
    const number = this.blocks.push(this.reading.decode(block.sheet.name))
    this.blockIndex.set(block, number)
    return number
  }
}

/** The map of placement k for one column and row of its array, the block's base point at its place. */
function placedMap(placements: Placements, k: number, column: number, row: number, base: [number, number]): Affine {
  const [a, b, c, d, e, f] = [0, 1, 2, 3, 4, 5].map((n) => placements.get(k, 'map', n))
  const shift = (n: 0 | 1) => column * placements.get(k, 'columnStep', n) + row * placements.get(k, 'rowStep', n)
  return { a, b, c, d, e: e + shift(0) - a * base[0] - c * base[1], f: f + shift(1) - b * base[0] - d * base[1] }
}
