import type { Finding } from '../geometry/finding'
import type { Does, Recipe, XY } from '../geometry/recipe'

/** How a figure was found: in closed form, by iteration to rounding, or by finite elements. */
export type OriginKind = 'exact' | 'iterated' | 'element'

/** The three ± of a figure, each absolute and in the figure's own unit; null θ and such have none. */
export interface PlusMinus {
  /** from the last written digit of the drawing's coordinates */
  digits?: number
  /** from repairs (gaps closed) */
  repairs?: number
  /** from the numerics */
  numerics?: number
}
export interface Origin {
  kind: OriginKind
  /** an element figure without bounds: its ± is the change between the last two meshes */
  estimate?: true
  plusMinus?: PlusMinus
}

/** The figures of a section: mm, mm², mm³, mm⁴, degrees, kg/m; x right, y up (engine conventions). */
export interface Section {
  area: number
  /** kg/m; absent without a material */
  mass?: number
  perimeter: { outer: number; inner: number }
  pieces: number
  extents: { minX: number; minY: number; maxX: number; maxY: number }
  centroid: { x: number; y: number }
  ix: number
  iy: number
  /** +∫xy dA about the centroid */
  ixy: number
  ip: number
  i1: number
  i2: number
  /** degrees, counter-clockwise from +x to axis 1, in (−90, 90]; null where every axis is principal */
  theta: number | null
  rx: number
  ry: number
  r1: number
  r2: number
  elastic: {
    xTop: number
    xBottom: number
    yRight: number
    yLeft: number
    axis1Left: number | null
    axis1Right: number | null
    axis2Right: number | null
    axis2Left: number | null
  }
  plastic: {
    x: number
    y: number
    axis1: number | null
    axis2: number | null
    /** offset of each neutral axis from the centroid: x along +y, y along +x, axis1 along axis 2, axis2 along axis 1 */
    at: { x: number; y: number; axis1: number | null; axis2: number | null }
    /** both ends where the half-area line may lie anywhere in a gap */
    atRange?: Partial<Record<'x' | 'y' | 'axis1' | 'axis2', [number, number]>>
  }
  /** plastic shape factors: plastic over the lesser elastic modulus of the axis */
  plasticShape: { x: number; y: number; axis1: number | null; axis2: number | null }
  /** plastic modulus of free bending (Mx alone, My alone) and the neutral axis' angle, degrees from +x */
  freePlastic: { x: number; y: number; angleX: number; angleY: number; restrainedMyForX: number; restrainedMxForY: number }
  circle: { x: number; y: number; radius: number }
  /** sums of the pieces' own second moments, without Steiner terms; present with more than one piece */
  withoutSteiner?: { ix: number; iy: number; ixy: number }
  /** torsion constant between its bounds; pieces that are not joined add. Absent where it was not sought, which a finding says */
  j?: { value: number; lower: number; upper: number }
  /** after Trefftz, free of Poisson's ratio; with iw and the shear areas only for one piece */
  shearCentre?: { x: number; y: number }
  /** about the shear centre, mm⁶ */
  iw?: number
  /** energy form at ν = 0, for a force along x and along y */
  shearArea?: { x: number; y: number }
  origin: Record<string, Origin>
}

export interface OutlineView {
  id: string
  layer: string
  edges: number
  /** drawing units², unsigned */
  area: number
  depth: number | null
  at: XY
  /** what it does in the make-up taken; absent in answers stored before this was told */
  does?: Does
}

/** The answer of the engine to bytes and a recipe: what API, command line and screens show. */
export interface SectionAnswer {
  engineVersion: string
  source: { name: string; bytes: number; sha256: string }
  recipe: Recipe
  unit: { drawing: string; mmPerUnit: number; declared: string }
  outlines: OutlineView[]
  outlinesTotal: number
  findings: Finding[]
  findingsTotal: number
  section: Section | null
}
