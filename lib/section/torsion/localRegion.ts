import { boundsOfEdges, unionOfBoxes } from '../../geometry/bounds'
import type { Region } from '../../geometry/region'
import { transformRegion } from '../../geometry/transform'

/** The region moved to the middle of its box, with the box's greater side: far from the origin the sums would lose digits. */
export function localRegion(region: Region): { local: Region; size: number; origin: { x: number; y: number } } {
  const [minX, minY, maxX, maxY] = unionOfBoxes(boundsOfEdges(region.edges), 0, region.edges.count)
  const origin = { x: (minX + maxX) / 2, y: (minY + maxY) / 2 }
  return {
    local: transformRegion(region, { move: { x: -origin.x, y: -origin.y } }),
    size: Math.max(maxX - minX, maxY - minY),
    origin,
  }
}
