import { type Finding, makeFinding } from '../geometry/finding'
import type { Region, Repair } from '../geometry/region'
import { type Boundary, boundaryOf } from './boundary'
import { type Bundles, boxOf, bundlesOf } from './bundles'
import { changeByDisplacement, changeByRepairs } from './change'
import { circumscribingCircle } from './circle'
import { extremesOf } from './extremes'
import { SECTION_FINDINGS } from './findings'
import { type Frame, frameAt } from './frame'
import { freeBending, plasticVector } from './freeBending'
import { type Causes, originsOf } from './origins'
import { ownMoments, piecesMoments } from './pieces'
import { plasticFigures } from './plasticFigures'
import { type Principal, principalOf } from './principal'
import { torsionFigures } from './torsionFigures'
import type { Section } from './types'

export interface SectionInputs {
  /** half of the last written digit of the drawing's coordinates, mm; 0 if exact */
  lastDigit: number
  /** repairs in the region's axes, mm */
  repairs: readonly Repair[]
  /** kg/m³ of the whole section */
  density?: number
  /** several materials: each part's region and density, kg/m³ */
  parts?: readonly { region: Region; density: number }[]
}

export interface SectionResult {
  section: Section | null
  findings: Finding[]
}

/** Promise of the engine: 1e-9, or ten units in the last place of the coordinates times the figure's sensitivity. */
const PROMISE = 1e-9
const ULPS = 10

function massOf(area: number, { density, parts }: SectionInputs): number | undefined {
  if (!parts) return density === undefined ? undefined : area * density * 1e-6
  return parts.reduce((sum, { region, density: own }) => {
    return region.edges.count === 0 ? sum : sum + bundlesOf(region).moments.area * own * 1e-6
  }, 0)
}

/** Every figure of a region: those of `edgeFigures`, then torsion and shear by finite elements. */
export function sectionOf(region: Region, inputs: SectionInputs): SectionResult {
  const first = edgeFigures(region, inputs)
  return first.section ? withTorsion(first.section, region, first.findings) : first
}

/** A section from edge integrals with torsion and shear figures added, as far as they can be had. */
export function withTorsion(section: Section, region: Region, before: readonly Finding[]): SectionResult {
  const { figures, origin, findings } = torsionFigures(region)
  return { section: { ...section, ...figures, origin: { ...section.origin, ...origin } }, findings: [...before, ...findings] }
}

/**
 * The figures of a region (mm, turned upright) that exact integrals along its edges give. Signs and axes as in `Section`; a region
 * without metal, or with less than rounding can tell, gives no section but a finding.
 */
export function edgeFigures(region: Region, inputs: SectionInputs): SectionResult {
  const { edges } = region
  if (edges.count === 0) return nothing('no-metal')
  const bundles = bundlesOf(region)
  const { moments } = bundles
  const { area } = moments
  if (!(area > 0)) return nothing('no-metal')
  const frame = frameAt(bundles.x, bundles.y)
  const ix = moments.vv - moments.v ** 2 / area
  const iy = moments.uu - moments.u ** 2 / area
  const ixy = moments.uv - (moments.u * moments.v) / area
  const ip = ix + iy
  const boundary = boundaryOf(region, frame.x, frame.y)
  const causes = causesOf(region, inputs, boundary, frame)
  const principal = principalOf(edges, frame, { ix, iy, ixy }, causes)
  if (!(ix > 0 && iy > 0 && principal.i2 > 0 && area > causes.numerics.area)) return nothing('too-thin')
  const pieces = region.pieces > 1 ? piecesMoments(region, frame) : []
  const { plastic, shape, widths, across, findings } = plasticFigures(region, bundles, pieces, principal.theta, causes)
  const elastic = elasticOf(bundles, principal, ix, iy)
  const degrees = (radians: number) => (radians * 180) / Math.PI
  const vectorAt = plasticVector(bundles)
  const freeX = freeBending(vectorAt, 0, degrees(Math.atan2(ixy, iy)))
  const freeY = freeBending(vectorAt, -90, degrees(Math.atan2(ix, ixy)) - 90)
  const mass = massOf(area, inputs)
  const { circle, leverage } = circumscribingCircle(bundles)
  const section: Section = {
    area,
    ...(mass === undefined ? {} : { mass }),
    perimeter: { outer: boundary.outer, inner: boundary.inner },
    pieces: region.pieces,
    extents: boxOf(bundles),
    centroid: { x: frame.x, y: frame.y },
    ix,
    iy,
    ixy,
    ip,
    i1: principal.i1,
    i2: principal.i2,
    theta: principal.theta,
    rx: Math.sqrt(ix / area),
    ry: Math.sqrt(iy / area),
    r1: Math.sqrt(principal.i1 / area),
    r2: Math.sqrt(principal.i2 / area),
    elastic,
    plastic,
    plasticShape: shape(elastic),
    freePlastic: {
      x: freeX.modulus,
      y: freeY.modulus,
      angleX: freeX.angle,
      angleY: freeY.angle,
      restrainedMyForX: across.x,
      restrainedMxForY: 0 - across.y,
    },
    circle,
    ...(region.pieces > 1 ? { withoutSteiner: ownMoments(region, frame, pieces) } : {}),
    origin: {},
  }
  section.origin = originsOf(section, boundary, causes, { widths, circle: leverage })
  return { section, findings: [...sayings(section), ...findings] }
}

const nothing = (code: 'no-metal' | 'too-thin'): SectionResult => ({
  section: null,
  findings: [makeFinding(SECTION_FINDINGS, code)],
})

function causesOf({ edges }: Region, { lastDigit, repairs }: SectionInputs, boundary: Boundary, { x, y }: Frame): Causes {
  let largest = 0
  for (let i = 0; i < 4 * edges.count; i++) largest = Math.max(largest, Math.abs(edges.ends[i]))
  return {
    digits: lastDigit > 0 ? changeByDisplacement(boundary, lastDigit) : null,
    repairs: repairs.length > 0 ? changeByRepairs(repairs, x, y) : null,
    numerics: changeByDisplacement(boundary, ULPS * Number.EPSILON * largest, PROMISE),
  }
}

function elasticOf(bundles: Bundles, { theta, i1, i2 }: Principal, ix: number, iy: number): Section['elastic'] {
  const { x, y } = bundles
  const upright = extremesOf(bundles, frameAt(x, y))
  const turned = theta === null ? null : extremesOf(bundles, frameAt(x, y, theta))
  return {
    xTop: ix / upright.maxV,
    xBottom: ix / -upright.minV,
    yRight: iy / upright.maxU,
    yLeft: iy / -upright.minU,
    axis1Left: turned && i1 / turned.maxV,
    axis1Right: turned && i1 / -turned.minV,
    axis2Right: turned && i2 / turned.maxU,
    axis2Left: turned && i2 / -turned.minU,
  }
}

function sayings({ pieces, theta, plastic, freePlastic }: Section): Finding[] {
  const findings: Finding[] = []
  if (theta === null) findings.push(makeFinding(SECTION_FINDINGS, 'all-axes-principal'))
  if (pieces > 1) findings.push(makeFinding(SECTION_FINDINGS, 'pieces-not-joined', { pieces }))
  for (const axis of ['x', 'y'] as const) {
    const part = freePlastic[axis] / plastic[axis]
    if (part < 0.995) findings.push(makeFinding(SECTION_FINDINGS, 'free-plastic-lower', { axis, part }))
  }
  return findings
}
