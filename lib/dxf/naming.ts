import type { Layer } from './drawing'
import { BY_BLOCK, BY_LAYER, type Reading } from './reading'
import type { FileFacts } from './tables'

/** Numbers of `Reading` turned into indices of `Drawing`: names that differ only in case are one. */
export interface Naming {
  layers: Layer[]
  /** by number of the layer's name */
  layerOf: Uint32Array
  lineTypes: string[]
  /** by number of the line type's name; −1 by layer, −2 by block */
  lineTypeOf: Int32Array
  /** index of each layer's line type, by index of the layer */
  layerLineType: Uint32Array
  zero: number
  continuous: number
}

const merged = (names: readonly string[]): { kept: string[]; indexOf: Uint32Array } => {
  const kept: string[] = []
  const known = new Map<string, number>()
  const indexOf = Uint32Array.from(names, (name) => {
    const key = name.toUpperCase()
    const index = known.get(key) ?? kept.push(name) - 1
    known.set(key, index)
    return index
  })
  return { kept, indexOf }
}

/** Decodes names and merges those that are the same name to the format. */
export function nameThings(reading: Reading, facts: FileFacts, read: (raw: string) => string): Naming {
  const continuousRaw = reading.lineTypes.add('CONTINUOUS')
  const lineTypes = merged(reading.lineTypes.raw.map(read))
  // the first two stand for "by layer" and "by block" and are no line types of the drawing
  const lineTypeOf = Int32Array.from(lineTypes.indexOf, (index) =>
    index === BY_LAYER ? -1 : index === BY_BLOCK ? -2 : index - 2,
  )
  const continuous = lineTypeOf[continuousRaw]
  const layers = merged(reading.layers.raw.map(read))
  const layerLineType = new Uint32Array(layers.kept.length).fill(continuous)
  const rows: Layer[] = layers.kept.map((name) => ({
    name,
    off: false,
    frozen: false,
    // a layer of this name never plots, whatever the table says (from memory)
    plots: name.toUpperCase() !== 'DEFPOINTS',
    lineType: 'CONTINUOUS',
    entities: 0,
  }))
  for (const [raw, { off, frozen, plots, lineType }] of facts.layers) {
    const index = layers.indexOf[raw]
    const row = rows[index]
    row.off = off
    row.frozen = frozen
    row.plots = row.plots && plots
    layerLineType[index] = Math.max(0, lineTypeOf[lineType])
  }
  const kept = lineTypes.kept.slice(2)
  rows.forEach((row, index) => {
    row.lineType = kept[layerLineType[index]]
  })
  return {
    layers: rows,
    layerOf: layers.indexOf,
    lineTypes: kept,
    lineTypeOf,
    layerLineType,
    zero: layers.indexOf[0],
    continuous,
  }
}
