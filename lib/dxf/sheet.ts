import { type EdgeTable, emptyTable } from '../geometry/edges'
import type { Affine } from './affine'
import type { EntityColumns } from './drawing'
import { emptyEntities } from './entityTable'

/** A placed block, as an INSERT gives it; layer and line type as in the entity's row. */
export interface Placement {
  /** number of the block's name */
  block: number
  /** row that stands for the INSERT itself: its layer, line type, space, visibility and remarks */
  row: number
  /** from block coordinates to the coordinates around the INSERT, for column 0 and row 0 */
  map: Affine
  columns: number
  rows: number
  /** from one column or row to the next */
  columnStep: [number, number]
  rowStep: [number, number]
  /** where the INSERT stands in the file, for a finding: line, and the bytes of its handle */
  line: number
  handle: [number, number]
}

/** What is drawn in one place (the model and layouts together, or one block), blocks not yet opened. */
export interface Sheet {
  /** '' for the model and the layouts, else the block's name as its bytes */
  name: string
  entities: EntityColumns
  edges: EdgeTable
  placements: Placement[]
  /** kinds not turned into edges, by number of the kind */
  ignored: Map<number, number>
}

export const emptySheet = (name: string, entities = 16, edges = 16): Sheet => ({
  name,
  entities: emptyEntities(entities),
  edges: emptyTable(edges, 2 * edges),
  placements: [],
  ignored: new Map(),
})
