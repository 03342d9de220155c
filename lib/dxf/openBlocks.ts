import { type Affine, after } from './affine'
import type { BlockDefinition } from './blocks'
import { type EntityColumns, FROZEN_INSERT } from './drawing'
import { pushEntity } from './entityTable'
import type { Resolve } from './measureBlocks'
import type { Naming } from './naming'
import { placeEdges } from './placeEdges'
import { BY_BLOCK, BY_LAYER, type Reading } from './reading'
import type { Placement, Sheet } from './sheet'

/** What a placed entity takes from the inserts around it: indices of `Drawing`. */
export interface Surroundings {
  layer: number
  lineType: number
  space: number
  flags: number
  block: number
  insert: number
}

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
    private readonly resolve: Resolve,
    private readonly read: (raw: string) => string,
  ) {}

  /** Opens all inserts of a sheet whose own rows are in the root already, from row `first` on. */
  openAll(sheet: Sheet, map: Affine, first: number): void {
    const { entities } = this.reading.root
    for (const placement of sheet.placements) {
      const block = this.resolve(placement)
      if (!block) continue
      const row = first + placement.row
      const outer = entities.block[row]
      const { layers } = this.naming
      const around: Surroundings = {
        layer: entities.layer[row],
        lineType: entities.lineType[row],
        space: entities.space[row],
        flags: entities.flags[row] | (layers[entities.layer[row]].frozen ? FROZEN_INSERT : 0),
        block: outer === 0 ? this.numberOf(block) : outer,
        insert: entities.insert[row],
      }
      for (let j = 0; j < placement.rows; j++) {
        for (let i = 0; i < placement.columns; i++) {
          this.inserts++
          const own = around.insert === 0 ? { ...around, insert: this.inserts } : around
          this.place(block, after(map, shifted(placement, i, j, block.base)), own)
        }
      }
    }
  }

  /** Puts one copy of a block's content into the root, and opens what it places in turn. */
  place(block: BlockDefinition, map: Affine, around: Surroundings): void {
    const { sheet } = block
    const { root } = this.reading
    const first = this.placeRows(sheet.entities, around)
    const far = placeEdges(root.edges, sheet.edges, map, first)
    if (far >= 0) this.reading.remark(first + far, 'placed-too-far', { kind: 'INSERT', handle: '', line: 0, block: sheet.name })
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
    const number = this.blocks.push(this.read(block.sheet.name))
    this.blockIndex.set(block, number)
    return number
  }
}

/** The placement's map for one column and row of its array, the block's base point at its place. */
function shifted({ map, columnStep, rowStep }: Placement, column: number, row: number, base: [number, number]): Affine {
  return {
    ...map,
    e: map.e + column * columnStep[0] + row * rowStep[0] - map.a * base[0] - map.c * base[1],
    f: map.f + column * columnStep[1] + row * rowStep[1] - map.b * base[0] - map.d * base[1],
  }
}
