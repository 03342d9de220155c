import type { EntityColumns } from './drawing'

/** An empty table of entities; it grows by itself. */
export function emptyEntities(size = 16): EntityColumns {
  return {
    count: 0,
    kind: new Uint8Array(size),
    layer: new Uint32Array(size),
    lineType: new Uint32Array(size),
    space: new Uint16Array(size),
    block: new Uint32Array(size),
    insert: new Uint32Array(size),
    closed: new Uint8Array(size),
    flags: new Uint8Array(size),
    remark: new Uint32Array(size),
  }
}

/** Appends an entity drawn directly and returns its row. */
export function pushEntity(
  table: EntityColumns,
  kind: number,
  layer: number,
  lineType: number,
  space: number,
  flags: number,
): number {
  if (table.count === table.kind.length) grow(table)
  const row = table.count++
  table.kind[row] = kind
  table.layer[row] = layer
  table.lineType[row] = lineType
  table.space[row] = space
  table.flags[row] = flags
  return row
}

function grow(table: EntityColumns): void {
  const wider = emptyEntities(2 * table.kind.length)
  wider.count = table.count
  wider.kind.set(table.kind)
  wider.layer.set(table.layer)
  wider.lineType.set(table.lineType)
  wider.space.set(table.space)
  wider.block.set(table.block)
  wider.insert.set(table.insert)
  wider.closed.set(table.closed)
  wider.flags.set(table.flags)
  wider.remark.set(table.remark)
  Object.assign(table, wider)
}
