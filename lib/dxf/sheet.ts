import { type EdgeTable, emptyTable } from '../geometry/edges'
import type { EntityColumns } from './drawing'
import { emptyEntities } from './entityTable'

/** Numbers of one placement in `Placements.numbers`, from its first: */
export const PLACED = {
  /** number of the block's name */
  block: 0,
  /** row that stands for the INSERT itself: its layer, line type, space, visibility and remarks */
  row: 1,
  /** a b c d e f from block coordinates to the coordinates around the INSERT, for column 0 and row 0 */
  map: 2,
  columns: 8,
  rows: 9,
  /** x y from one column, and from one row, to the next */
  columnStep: 10,
  rowStep: 12,
  /** where the INSERT stands in the file, for a finding: line, and the bytes of its handle */
  line: 14,
  handleFrom: 15,
  handleTo: 16,
} as const
const NUMBERS_EACH = 17

/** Placed blocks in columns, as INSERTs give them: a file may hold a million. */
export class Placements {
  count = 0
  private numbers = new Float64Array(0)

  push(values: readonly number[]): void {
    const at = NUMBERS_EACH * this.count++
    if (at + NUMBERS_EACH > this.numbers.length) {
      const wider = new Float64Array(Math.max(8 * NUMBERS_EACH, 2 * this.numbers.length))
      wider.set(this.numbers)
      this.numbers = wider
    }
    this.numbers.set(values, at)
  }

  get(i: number, key: keyof typeof PLACED, offset = 0): number {
    return this.numbers[NUMBERS_EACH * i + PLACED[key] + offset]
  }
}

/** What is drawn in one place (the model and layouts together, or one block), blocks not yet opened. */
export interface Sheet {
  /** '' for the model and the layouts, else the block's name as its bytes */
  name: string
  entities: EntityColumns
  edges: EdgeTable
  placements: Placements
  /** kinds not turned into edges, by number of the kind */
  ignored: Map<number, number>
}

export const emptySheet = (name: string, entities = 16, edges = 16): Sheet => ({
  name,
  entities: emptyEntities(entities),
  edges: emptyTable(edges, 2 * edges),
  placements: new Placements(),
  ignored: new Map(),
})
