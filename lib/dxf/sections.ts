import { type BlockDefinition, openBlock } from './blocks'
import type { ReadLimits } from './drawing'
import { readArc, readCircle } from './entities/arc'
import { readEllipse } from './entities/ellipse'
import { readDimension } from './entities/dimension'
import { readHatch } from './entities/hatch'
import { readInsert } from './entities/insert'
import { readLine } from './entities/line'
import { readLwPolyline } from './entities/lwpolyline'
import { readSpline } from './entities/spline'
import { closePolyline, type OpenPolyline, openPolyline, readVertex } from './entities/polyline'
import { dxfFinding, quoted } from './findings'
import {
  ARC_KIND,
  CIRCLE_KIND,
  ELLIPSE_KIND,
  HATCH_KIND,
  INSERT_KIND,
  kindNumber,
  LINE_KIND,
  LWPOLYLINE_KIND,
  POLYLINE_KIND,
  SPLINE_KIND,
} from './kinds'
import type { Reading } from './reading'
import { type FileFacts, noFacts, readBlockRecord, readDimensionStyle, readHeader, readLayer, readLayout } from './tables'
import { rawText, textReader } from './text'

const VERTEX = kindNumber('VERTEX')
const DIMENSION = kindNumber('DIMENSION')
const SEQEND = kindNumber('SEQEND')
const SECTION = kindNumber('SECTION')
const ENDSEC = kindNumber('ENDSEC')
const EOF = kindNumber('EOF')
const BLOCK = kindNumber('BLOCK')
const ENDBLK = kindNumber('ENDBLK')
const LAYER = kindNumber('LAYER')
const LTYPE = kindNumber('LTYPE')
const BLOCK_RECORD = kindNumber('BLOCK_RECORD')
const DIMSTYLE = kindNumber('DIMSTYLE')
const LAYOUT = kindNumber('LAYOUT')

/** Blocks that a file may define; each takes memory even when empty. */
const MOST_BLOCKS = 100_000

/** What the walk over the file's sections found, besides what is in `Reading`. */
export interface FileContent {
  facts: FileFacts
  blocks: BlockDefinition[]
}

/** Reads all records of the file, section by section, whatever their order and number. */
export function readSections(reading: Reading, limits: ReadLimits): FileContent {
  const walk = new Walk(reading, limits)
  walk.run()
  return { facts: walk.facts, blocks: walk.blocks }
}

class Walk {
  readonly facts = noFacts()
  readonly blocks: BlockDefinition[] = []
  private section = ''
  private polyline: OpenPolyline | null = null
  private entities = 0
  private entitiesComplete = false
  private sectionless = false
  private blockLimitPassed = false
  private readonly sections = new Map<string, number>()

  constructor(
    private readonly reading: Reading,
    private readonly limits: ReadLimits,
  ) {}

  run(): void {
    const { reading } = this
    const { record, cursor } = reading
    // groups before the first 0 belong to no record
    let more = cursor.next()
    while (more && cursor.code !== 0) more = cursor.next()
    let ended = false
    while (more) {
      ended = record.begin() === EOF
      if (ended) break
      more = record.read()
      // a record at which the file ends may be cut short; only the end of a section needs no more
      if (more || (record.kind === ENDSEC && cursor.fault === 'none')) this.take()
      if (this.passesLimit()) return
    }
    this.endPolyline(false)
    this.endBlock()
    this.reportEnd(ended)
    this.reportSections()
  }

  private passesLimit(): boolean {
    const { findings } = this.reading
    const { entities } = this.limits
    if (this.blockLimitPassed) findings.add('too-many-blocks', () => dxfFinding('too-many-blocks', { limit: MOST_BLOCKS }))
    else if (this.entities > entities) {
      findings.add('too-many-entities', () => dxfFinding('too-many-entities', { limit: entities, setting: 'entities' }))
    } else return false
    return true
  }

  private take(): void {
    const { record } = this.reading
    const { kind } = record
    if (kind === SECTION) this.openSection()
    else if (kind === ENDSEC) this.closeSection()
    else if (this.section === 'TABLES') this.takeTableRecord(kind)
    else if (this.section === 'BLOCKS') this.takeBlockRecord(kind)
    else if (this.section === 'ENTITIES') this.takeEntity(kind)
    else if (this.section === 'OBJECTS') {
      if (kind === LAYOUT) readLayout(this.reading, this.facts)
    } else if (this.section === '') {
      this.sectionless = true
      this.takeEntity(kind)
    }
  }

  private openSection(): void {
    const { reading } = this
    const { record } = reading
    this.endPolyline(false)
    this.endBlock()
    const g = record.find(2)
    this.section = g < 0 ? '?' : rawText(record.cursor.bytes, record.from[g], record.to[g]).toUpperCase()
    this.sections.set(this.section, (this.sections.get(this.section) ?? 0) + 1)
    if (this.section === 'HEADER') this.readHeader()
    if (this.section === 'ENTITIES') this.entitiesComplete = false
  }

  private readHeader(): void {
    const { reading, facts } = this
    readHeader(reading, facts)
    const { known, read } = textReader(facts.version, facts.codePage, reading.marked)
    reading.decode = read
    const page = facts.codePage
    if (!known) reading.findings.add('encoding-unknown', () => dxfFinding('encoding-unknown', { page }))
  }

  private closeSection(): void {
    this.endPolyline(false)
    this.endBlock()
    if (this.section === 'ENTITIES') this.entitiesComplete = true
    this.section = ''
  }

  private takeTableRecord(kind: number): void {
    const { reading, facts } = this
    if (kind === LAYER) readLayer(reading, facts)
    else if (kind === BLOCK_RECORD) readBlockRecord(reading, facts)
    else if (kind === DIMSTYLE) readDimensionStyle(reading, facts)
    else if (kind === LTYPE) {
      const g = reading.record.find(2)
      if (g >= 0) reading.lineTypes.idOf(reading.record.from[g], reading.record.to[g])
    }
  }

  private takeBlockRecord(kind: number): void {
    if (kind === BLOCK) {
      this.endPolyline(false)
      this.endBlock()
      if (this.blocks.length >= MOST_BLOCKS) {
        this.blockLimitPassed = true
        return
      }
      const block = openBlock(this.reading)
      this.blocks.push(block)
      this.reading.sheet = block.sheet
    } else if (kind === ENDBLK) {
      this.endPolyline(false)
      this.endBlock()
    } else if (this.reading.sheet !== this.reading.root) this.takeEntity(kind)
  }

  private endBlock(): void {
    const { reading } = this
    const block = this.blocks.at(-1)
    if (block && reading.sheet === block.sheet) block.to = reading.cursor.from
    reading.sheet = reading.root
  }

  private takeEntity(kind: number) {
    const { reading } = this
    if (kind === VERTEX && this.polyline) return readVertex(reading, this.polyline)
    if (kind === SEQEND) return this.endPolyline(true)
    this.endPolyline(false)
    this.entities++
    reading.common()
    switch (kind) {
      case LINE_KIND:
        return readLine(reading)
      case ARC_KIND:
        return readArc(reading)
      case CIRCLE_KIND:
        return readCircle(reading)
      case ELLIPSE_KIND:
        return readEllipse(reading)
      case LWPOLYLINE_KIND:
        return readLwPolyline(reading)
      case POLYLINE_KIND:
        this.polyline = openPolyline(reading)
        return
      case SPLINE_KIND:
        return readSpline(reading)
      case HATCH_KIND:
        return readHatch(reading)
      case DIMENSION:
        return readDimension(reading)
      case INSERT_KIND:
        return readInsert(reading)
      case VERTEX:
        return
      default:
        reading.ignore(kind)
    }
  }

  private endPolyline(ended: boolean): void {
    const { polyline } = this
    this.polyline = null
    if (polyline) closePolyline(this.reading, polyline, ended)
  }

  private reportEnd(ended: boolean): void {
    const { reading } = this
    const { cursor, findings } = reading
    const place = reading.place(cursor.line)
    if (cursor.fault === 'code') {
      const text = this.badLine()
      findings.add('file-broken', () => dxfFinding('file-broken', { place, text }))
    } else if (ended) {
      if (cursor.goesOn()) findings.add('file-goes-on', () => dxfFinding('file-goes-on', { place }))
    } else if (cursor.fault === 'none' && this.entitiesComplete && this.section === '') {
      findings.add('file-without-eof', () => dxfFinding('file-without-eof', { place }))
    } else {
      const where = this.section === '' ? 'outside all sections' : `in section ${quoted(this.section)}`
      findings.add('file-cut', () => dxfFinding('file-cut', { place, in: where }))
    }
  }

  private badLine(): string {
    const { cursor } = this.reading
    return quoted(rawText(cursor.bytes, cursor.at, Math.min(cursor.bytes.length, cursor.at + 40)).split(/[\r\n]/)[0])
  }

  private reportSections(): void {
    const { findings } = this.reading
    if (this.sectionless) findings.add('file-without-sections', () => dxfFinding('file-without-sections'))
    for (const [section, count] of this.sections) {
      if (count > 1) findings.add('sections-repeated', () => dxfFinding('sections-repeated', { section, count }))
    }
  }
}
