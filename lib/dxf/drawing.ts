import type { EdgeTable, Point } from '../geometry/edges'
import type { Finding } from '../geometry/finding'

export interface Layer {
  name: string
  off: boolean
  frozen: boolean
  plots: boolean
  lineType: string
  /** entities on it in model space that gave edges, hatches not counted */
  entities: number
}

/** `EntityColumns.flags`: 60 = 1 on the entity or on an insert around it. */
export const INVISIBLE = 1
/** `EntityColumns.flags`: the boundary of a hatch. */
export const HATCH_BOUNDARY = 2
/** `EntityColumns.flags`: placed by an insert on a frozen layer, which hides all it places. */
export const FROZEN_INSERT = 4
/** `EntityColumns.flags`: a line of a hatch's pattern, placed by an anonymous block *X as up to R12. */
export const HATCH_PATTERN = 8

/** DXF entities (after blocks were opened up: one per placed entity). Columns, one row an entity. */
export interface EntityColumns {
  count: number
  /** index into `Drawing.kinds` */
  kind: Uint8Array
  /** index into `Drawing.layers` */
  layer: Uint32Array
  /** index into `Drawing.lineTypes`, resolved (BYLAYER and BYBLOCK answered) */
  lineType: Uint32Array
  /** index into `Drawing.spaces`; 0 is model space */
  space: Uint16Array
  /** index into `Drawing.blocks` + 1 of the outermost INSERT's block; 0 where drawn directly */
  block: Uint32Array
  /** index of the placed INSERT (a running number from 1) the entity came from; 0 where drawn directly */
  insert: Uint32Array
  /** 1 where the entity closes on itself (CIRCLE, closed polyline, full ellipse, closed spline) */
  closed: Uint8Array
  /** INVISIBLE, HATCH_BOUNDARY, FROZEN_INSERT, HATCH_PATTERN */
  flags: Uint8Array
  /** index into `Drawing.remarks` + 1: what there is to say about this entity; 0 for nothing */
  remark: Uint32Array
}

/** A DIMENSION entity: evidence of a size. Places in world coordinates, drawing units. */
export interface DrawnDimension {
  kind: 'linear' | 'aligned' | 'angular' | 'diameter' | 'radius' | 'ordinate' | 'arc'
  /** code 42 where present, else measured from the definition points; degrees for angular */
  measured: number
  /** text override as written, '' for none */
  text: string
  /** the number read from the text override, in the text's own unit; null where the text names none */
  textValue: number | null
  tolerance: { plus: number; minus: number } | null
  layer: string
  a: Point
  b: Point
  /** angle of a linear dimension, degrees */
  angle: number
  at: Point
}

/** What was read from the file. */
export interface Drawing {
  /** $ACADVER, '' where the file does not say */
  acadVersion: string
  /** 'none' or the unit's name as $INSUNITS says it: 'mm', 'in', … */
  declared: string
  /** mm per drawing unit from $INSUNITS; null for none */
  declaredMm: number | null
  measurement: 'metric' | 'english' | null
  layers: Layer[]
  lineTypes: string[]
  spaces: string[]
  blocks: string[]
  kinds: string[]
  entities: EntityColumns
  edges: EdgeTable
  /** entities read and entities not turned into edges, by kind, whole file, blocks opened up (model space and layouts) */
  read: Record<string, number>
  ignored: Record<string, number>
  dimensions: DrawnDimension[]
  /** half of the last written digit of the coordinates, drawing units; 0 if exact */
  lastDigit: number
  /** what concerns the file as a whole; with an error among them there is no section */
  findings: Finding[]
  /** how many there are; `findings` lists 2,000 of one code */
  findingsTotal: number
  /**
   * What concerns single entities: rows point here, and `selectEdges` reports the remarks of the rows it
   * takes, so that a fault on a layer nobody wants blocks nothing.
   */
  remarks: Finding[][]
}

/** Limits on one file; the figures are named in the finding that a breach gives. */
export interface ReadLimits {
  bytes: number
  entities: number
  nesting: number
}
export const DEFAULT_LIMITS: ReadLimits = { bytes: 64 * 1024 * 1024, entities: 2_000_000, nesting: 32 }
