import type { Region } from '../geometry/region'
import { documentAround } from './write/document'
import { GroupWriter } from './write/groupWriter'
import { writeLoop } from './write/loops'

/**
 * The clean region as a DXF (R2000): outer loops on layer OUTER, holes on layer HOLES. Loops of lines and circular arcs
 * are closed LWPOLYLINEs with bulges, full circles CIRCLEs, other loops one LINE, ARC, ELLIPSE or SPLINE an edge.
 * Numbers are written in the shortest form that reads back to the same double.
 * `unit` is the region's own, a name of $INSUNITS ('mm', 'in', …).
 */
export function writeRegionDxf(region: Region, { unit }: { unit: string }): string {
  const entities = new GroupWriter()
  for (let loop = 0; loop + 1 < region.loopStart.length; loop++) writeLoop(entities, region, loop)
  return documentAround(entities, unit)
}
