import { area } from './area'
import { centroidX, centroidY } from './centroid'
import { circle } from './circle'
import { elastic12, elasticXY } from './elastic'
import { extents } from './extents'
import type { Figure } from './figure'
import { freePlastic } from './freePlastic'
import { mass } from './mass'
import { perimeterInner, perimeterOuter } from './perimeter'
import { perimeterFactor } from './perimeterFactor'
import { pieces } from './pieces'
import { plasticModulus, plasticOffset } from './plastic'
import { plasticShape } from './plasticShape'
import { i1, i2, theta } from './principal'
import { r1, r2, rx, ry } from './radii'
import { ip, ix, ixy, iy } from './secondMoments'
import { BENDING_AXES } from './spread'
import { torsion } from './torsion'
import { withoutSteiner } from './withoutSteiner'

/** Every figure of a section, in the order in which sheet, CSV and JSON show them. */
export const FIGURES: readonly Figure[] = [
  area,
  mass,
  perimeterOuter,
  perimeterInner,
  perimeterFactor,
  pieces,
  ...extents,
  ...circle,
  centroidX,
  centroidY,
  ix,
  iy,
  ixy,
  ip,
  ...withoutSteiner,
  rx,
  ry,
  ...elasticXY,
  i1,
  i2,
  theta,
  r1,
  r2,
  ...elastic12,
  ...BENDING_AXES.map(plasticModulus),
  ...BENDING_AXES.map(plasticOffset),
  ...BENDING_AXES.map(plasticShape),
  ...freePlastic,
  ...torsion,
]
