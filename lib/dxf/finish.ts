import { IDENTITY } from './affine'
import { type Drawing, HATCH_BOUNDARY, type ReadLimits } from './drawing'
import { drawnDimensions } from './dimensions'
import { dxfFinding } from './findings'
import { INSERT_KIND, KINDS, PERHAPS_METAL } from './kinds'
import { lastDigitOf } from './lastDigit'
import { measureBlocks } from './measureBlocks'
import { type Naming, nameThings } from './naming'
import { BlockOpener } from './openBlocks'
import type { Reading } from './reading'
import type { FileContent } from './sections'
import type { Sheet } from './sheet'
import type { FileFacts } from './tables'
import { DXF_UNITS } from './units'

/** Turns what was read into a drawing: names decoded, line types answered, blocks opened up, things counted. */
export function finishDrawing(reading: Reading, { facts, blocks }: FileContent, limits: ReadLimits): Drawing {
  const { root, findings, decode: read } = reading
  const naming = nameThings(reading, facts, read)
  const spaces = new Spaces(facts, read)
  const spaceBlocks = blocks.filter(({ sheet }) => /^[*$](MODEL|PAPER)_SPACE/i.test(sheet.name))
  const shown = measureBlocks(reading, blocks, [root, ...spaceBlocks.map((b) => b.sheet)], limits)
  const opener = new BlockOpener(reading, naming, blocks, shown ?? new Map())
  answerRoot(reading, naming, opener, spaces)
  opener.count(root)
  opener.openAll(root, IDENTITY, 0)
  if (shown) {
    for (const block of spaceBlocks) {
      const space = /model/i.test(block.sheet.name) ? 0 : spaces.ofBlock(block.sheet.name)
      opener.place(block, IDENTITY, { layer: naming.zero, lineType: naming.continuous, space, flags: 0, block: 0, insert: 0 })
    }
  }
  if (reading.low < reading.high) {
    const { low, high } = reading
    findings.add('heights-differ', () => dxfFinding('heights-differ', { low, high }))
  }
  const counts = count(root, naming)
  const others = new Map([...opener.ignored].map(([kind, n]): [string, number] => [read(reading.record.kinds.raw[kind]), n]))
  for (const [name, n] of others) counts.ignored.set(name, n)
  reportIgnored(reading, others)
  if (opener.inserts > 0) counts.read.set('INSERT', opener.inserts)
  const dimensions = drawnDimensions(reading, facts, (raw) => naming.layers[naming.layerOf[raw]], read)
  return {
    acadVersion: facts.version,
    ...unitOf(reading, facts),
    layers: naming.layers,
    lineTypes: naming.lineTypes,
    spaces: spaces.names,
    blocks: opener.blocks,
    kinds: [...KINDS],
    entities: root.entities,
    edges: root.edges,
    read: Object.fromEntries(counts.read),
    ignored: Object.fromEntries(counts.ignored),
    dimensions,
    lastDigit: lastDigitOf(reading.record.digits),
    findings: findings.items,
    findingsTotal: findings.total,
    remarks: reading.remarks,
  }
}

/** Names of the spaces: the model, and the layouts that hold something. */
class Spaces {
  readonly names = ['model']
  private readonly indexOf = new Map<string, number>()

  constructor(
    private readonly facts: FileFacts,
    private readonly read: (raw: string) => string,
  ) {}

  /** Index of the layout named so; '' is the one that was open when the file was saved. */
  ofLayout(raw: string): number {
    return raw === '' ? this.ofBlock('*Paper_Space') : this.add(this.read(raw))
  }

  ofBlock(block: string): number {
    return this.add(this.read(this.facts.layouts.get(block.toUpperCase()) ?? 'layout'))
  }

  private add(name: string): number {
    const index = this.indexOf.get(name) ?? this.names.push(name) - 1
    this.indexOf.set(name, index)
    return index
  }
}

/** Rows of the root hold numbers of names as read; here they become indices of the drawing. */
function answerRoot({ root, layouts }: Reading, naming: Naming, opener: BlockOpener, spaces: Spaces): void {
  const { entities } = root
  const spaceOf = new Map<number, number>([[0, 0]])
  for (let row = 0; row < entities.count; row++) {
    const layer = naming.layerOf[entities.layer[row]]
    entities.layer[row] = layer
    entities.lineType[row] = opener.lineType(entities.lineType[row], layer, naming.continuous)
    const raw = entities.space[row]
    if (raw === 0) continue
    const space = spaceOf.get(raw) ?? spaces.ofLayout(layouts.raw[raw - 1])
    spaceOf.set(raw, space)
    entities.space[row] = space
  }
}

/** Counts entities by kind and by layer: those that gave edges, and those that gave none. */
function count({ entities, edges }: Sheet, { layers }: Naming) {
  const gave = new Uint8Array(entities.count)
  for (let i = 0; i < edges.count; i++) gave[edges.source[i]] = 1
  const reads = new Uint32Array(KINDS.length)
  const ignores = new Uint32Array(KINDS.length)
  for (let row = 0; row < entities.count; row++) {
    const kind = entities.kind[row]
    if (gave[row] === 0) {
      if (kind !== INSERT_KIND) ignores[kind]++
      continue
    }
    reads[kind]++
    if (entities.space[row] === 0 && (entities.flags[row] & HATCH_BOUNDARY) === 0) layers[entities.layer[row]].entities++
  }
  const named = (counts: Uint32Array) =>
    new Map<string, number>([...counts].map((n, kind): [string, number] => [KINDS[kind], n]).filter(([, n]) => n > 0))
  return { read: named(reads), ignored: named(ignores) }
}

function reportIgnored({ findings }: Reading, ignored: Map<string, number>): void {
  const list = (metal: boolean) =>
    [...ignored]
      .filter(([kind]) => PERHAPS_METAL.has(kind) === metal)
      .sort(([, m], [, n]) => n - m)
      .map(([kind, n]) => `${n} ${kind}`)
      .join(', ')
  if (list(false) !== '') findings.add('entities-ignored', () => dxfFinding('entities-ignored', { list: list(false) }))
  if (list(true) !== '') findings.add('entities-unread', () => dxfFinding('entities-unread', { list: list(true) }))
}

function unitOf({ findings }: Reading, facts: FileFacts): Pick<Drawing, 'declared' | 'declaredMm' | 'measurement'> {
  const measurement = facts.measurement === '1' ? 'metric' : facts.measurement === '0' ? 'english' : null
  const text = facts.unit ?? '0'
  const unit = /^[+]?\d+$/.test(text) ? DXF_UNITS[Number(text)] : undefined
  if (unit) return { declared: unit.name, declaredMm: unit.mm, measurement }
  if (/^[+-]?\d+$/.test(text)) findings.add('unit-unknown', () => dxfFinding('unit-unknown', { code: text }))
  else findings.add('unit-bad', () => dxfFinding('unit-bad', { text }))
  return { declared: 'none', declaredMm: null, measurement }
}
