import type { Finding, FindingParams } from '../geometry/finding'
import { pushEntity } from './entityTable'
import { INVISIBLE } from './drawing'
import { FindingList, LISTED_PER_CODE } from './findingList'
import { type DxfCode, dxfFinding } from './findings'
import { bytesToText, Names } from './names'
import { GroupRecord, type Slots } from './record'
import { textReader } from './text'
import { emptySheet, type Sheet } from './sheet'
import type { GroupCursor } from './groups'
import { ALL_KINDS, kindNumber } from './kinds'
import type { RawDimension } from './entities/dimension'
import { Vertices } from './entities/vertices'

/** Line types of an entity that names none, or the insert's; numbers of `Reading.lineTypes`. */
export const BY_LAYER = 0
export const BY_BLOCK = 1
/** Layer 0; number of `Reading.layers`. */
export const LAYER_ZERO = 0

/** Kinds and layouts that are told apart; no drawing has as many, a hostile file may. */
const MOST_KINDS = 1000
const MOST_LAYOUTS = 10_000

/** Sine of the tilt that still counts as none: it changes lengths by less than 1e-14. */
const LEAST_TILT = 1e-7

/** What names a group in a sentence. */
const WORDS: Record<number, string> = {
  2: 'the name of the block',
  10: 'the x of its first point',
  20: 'the y of its first point',
  11: 'the x of its second point',
  21: 'the y of its second point',
  40: 'its radius or ratio',
  41: 'its start',
  42: 'its end',
  50: 'its start angle',
  51: 'its end angle',
  71: 'its degree',
}
const WORDS_OF_KIND: Record<string, Record<number, string>> = {
  CIRCLE: { 10: 'the x of its centre', 20: 'the y of its centre', 40: 'its radius' },
  ARC: { 10: 'the x of its centre', 20: 'the y of its centre', 40: 'its radius' },
  ELLIPSE: {
    10: 'the x of its centre',
    20: 'the y of its centre',
    11: 'the x of its major axis',
    21: 'the y of its major axis',
    40: 'its axis ratio',
  },
  INSERT: { 10: 'the x of its place', 20: 'the y of its place', 41: 'its x scale', 42: 'its y scale', 50: 'its rotation' },
}

/** All that stands open while a file is read. One object, handed to the readers of entities. */
export class Reading {
  readonly record: GroupRecord
  readonly findings = new FindingList()
  readonly remarks: Finding[][] = []
  readonly layers: Names
  readonly lineTypes: Names
  readonly blocks: Names
  /** number 0 is the layout that was open when the file was saved */
  readonly layouts: Names
  readonly vertices = new Vertices()
  readonly dimensions: RawDimension[] = []
  readonly root: Sheet
  /** where entities go now: the root, or a block being defined */
  sheet: Sheet
  /** turns the bytes of names and texts into text; settled once the header is read */
  decode: (raw: string) => string
  /** heights at which the root's entities lie */
  low = Number.POSITIVE_INFINITY
  high = Number.NEGATIVE_INFINITY

  // what the record at hand says in the groups that all entities share
  layer = 0
  lineType = 0
  space = 0
  flags = 0
  /** 1 where the entity's plane is the drawing's, −1 where it is seen from behind (x mirrored), 0 where it is tilted */
  facing: 1 | -1 | 0 = 1
  private readonly lastOfCode = new Map<string, number>()
  private readonly countOfCode = new Map<string, number>()

  constructor(
    readonly cursor: GroupCursor,
    readonly marked: boolean,
    private readonly binary: boolean,
  ) {
    const { bytes } = cursor
    this.decode = textReader('', '', marked).read
    this.record = new GroupRecord(cursor, new Names(bytes, ALL_KINDS, MOST_KINDS, kindNumber('OTHER')))
    this.layers = new Names(bytes, ['0'])
    this.lineTypes = new Names(bytes, ['BYLAYER', 'BYBLOCK'])
    this.blocks = new Names(bytes)
    this.layouts = new Names(bytes, [''], MOST_LAYOUTS)
    const guess = Math.min(1 << 20, bytes.length >> 6)
    this.root = emptySheet('', guess + 16, guess + 16)
    this.sheet = this.root
  }

  /** Reads the groups that all entities share: layer, line type, space, visibility, extrusion direction. */
  common(): void {
    const { record } = this
    this.layer = LAYER_ZERO
    this.lineType = BY_LAYER
    this.space = 0
    this.flags = 0
    this.facing = 1
    let layout = 0
    let tilted = false
    for (let g = 0; g < record.count; g++) {
      switch (record.code[g]) {
        case 6:
          this.lineType = this.lineTypes.idOf(record.from[g], record.to[g])
          break
        case 8:
          this.layer = this.layers.idOf(record.from[g], record.to[g])
          break
        case 60:
          if (record.number(g) === 1) this.flags |= INVISIBLE
          break
        case 67:
          if (record.number(g) === 1) this.space = 1
          break
        case 410:
          layout = this.layouts.idOf(record.from[g], record.to[g])
          break
        case 210:
        case 220:
        case 230:
          tilted = true
          break
      }
    }
    if (this.space === 1) this.space = 1 + layout
    if (tilted) this.facing = this.readFacing()
  }

  private readFacing(): 1 | -1 | 0 {
    const { record } = this
    const part = (code: number, otherwise: number) => {
      const g = record.find(code)
      return g < 0 ? otherwise : record.number(g)
    }
    const x = part(210, 0)
    const y = part(220, 0)
    const z = part(230, 1)
    const length = Math.hypot(x, y, z)
    if (!(length > 0) || !(Math.hypot(x, y) <= LEAST_TILT * length)) return 0
    return z > 0 ? 1 : -1
  }

  /** A row for the entity at hand. */
  begin(kind: number): number {
    return pushEntity(this.sheet.entities, kind, this.layer, this.lineType, this.space, this.flags)
  }

  /** Reads the wanted groups; where that fails, the entity becomes a row without edges that says why. */
  take(kind: number, wanted: Slots): boolean {
    if (this.record.scan(wanted)) return true
    this.refuseRecord(kind)
    return false
  }

  /** As `take`, for entities that lie in a plane of their own. */
  takeInPlane(kind: number, wanted: Slots): boolean {
    if (this.facing !== 0) return this.take(kind, wanted)
    this.refuseTilted(kind)
    return false
  }

  refuseTilted(kind: number): void {
    const { record } = this
    const direction = [210, 220, 230].map((code) => (record.find(code) < 0 ? '0' : this.text(record.find(code)))).join(', ')
    this.refuse(kind, 'tilted', { direction: `(${direction})` })
  }

  /** The entity at hand becomes a row without edges, with the fault that the record holds. */
  refuseRecord(kind: number): void {
    const row = this.begin(kind)
    if (!this.shareRemark(row, this.record.fault)) this.remarkFault(row, this.where(kind))
  }

  /** Adds the fault that the record holds to a row. */
  remarkFault(row: number, where: FindingParams): void {
    const { record } = this
    const { fault, faultCode: code, faultGroup: g } = record
    const what = WORDS_OF_KIND[String(where.kind)]?.[code] ?? WORDS[code] ?? 'a value'
    this.remark(row, fault, {
      ...where,
      code,
      what,
      text: g < 0 ? '' : this.text(g),
      at: g < 0 ? '' : this.place(record.lines[g] + 1),
    })
  }

  /** The entity at hand becomes a row without edges that says why. */
  refuse(kind: number, code: DxfCode, params: FindingParams = {}): void {
    const row = this.begin(kind)
    if (!this.shareRemark(row, code)) this.remark(row, code, { ...this.where(kind), ...params })
  }

  /** Adds a remark to a row of the sheet. Beyond 2,000 of one code rows share the last one. */
  remark(row: number, code: DxfCode, params: FindingParams, at?: [number, number]): void {
    if (this.shareRemark(row, code)) return
    this.countOfCode.set(code, (this.countOfCode.get(code) ?? 0) + 1)
    const { entities } = this.sheet
    const place = this.sheet === this.root ? at : undefined
    const own = entities.remark[row]
    const finding = dxfFinding(
      code,
      this.sheet === this.root ? params : { ...params, block: this.decode(this.sheet.name) },
      place,
    )
    if (own > 0) this.remarks[own - 1].push(finding)
    else entities.remark[row] = this.remarks.push([finding])
    this.lastOfCode.set(code, entities.remark[row])
  }

  /** Whether enough remarks of that code are kept; then the row shares the last one, unless it has its own. */
  private shareRemark(row: number, code: DxfCode): boolean {
    if ((this.countOfCode.get(code) ?? 0) < LISTED_PER_CODE) return false
    const { remark } = this.sheet.entities
    if (remark[row] === 0) remark[row] = this.lastOfCode.get(code) ?? 0
    return true
  }

  /** What leads a person to the entity at hand: its kind, handle and line. */
  where(kind: number): FindingParams {
    const g = this.record.find(5)
    return { kind: this.record.kinds.raw[kind], handle: g < 0 ? '' : this.text(g), place: this.place(this.record.line) }
  }

  /** A line of the file for a sentence; a binary file has groups instead. */
  place(line: number): string {
    return this.binary ? `group ${Math.ceil(line / 2)}` : `line ${line}`
  }

  /** The value of group g as it stands, for a sentence. */
  text(g: number): string {
    const { record } = this
    return this.decode(bytesToText(record.cursor.bytes, record.from[g], Math.min(record.to[g], record.from[g] + 60)).trim())
  }

  ignore(kind: number): void {
    const { ignored } = this.sheet
    ignored.set(kind, (ignored.get(kind) ?? 0) + 1)
  }

  /** Notes the height of a point of the root, and whether one entity lies at several. */
  height(z: number): void {
    if (this.sheet !== this.root || this.space !== 0) return
    if (z < this.low) this.low = z
    if (z > this.high) this.high = z
  }
}
