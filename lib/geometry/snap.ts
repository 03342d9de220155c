import Flatbush from 'flatbush'
import { boundsOfEdges } from './bounds'
import { ARC, type EdgeTable, ELLIPSE } from './edges'
import { jetAt, newJet } from './evaluate'
import { nearestOn } from './nearest'

/** A place to measure from, found near the pointer. */
export interface Snap {
  kind: 'end' | 'centre' | 'middle' | 'edge'
  x: number
  y: number
  edge: number
  distance: number
}

const RANK = { end: 0, middle: 1, centre: 1, edge: 2 }

/**
 * A function that finds, within `radius` of a point, an end of an edge, else the nearer of middles and centres, else
 * the nearest point on an edge; null where nothing is near. Coordinates and radius in the table's units.
 */
export function snapperOf(edges: EdgeTable): (x: number, y: number, radius: number) => Snap | null {
  if (edges.count === 0) return () => null
  const boxes = boundsOfEdges(edges)
  const index = new Flatbush(edges.count)
  for (let i = 0; i < edges.count; i++) {
    const k = edges.shape[i]
    const round = edges.kind[i] === ARC || edges.kind[i] === ELLIPSE
    const cx = round ? edges.shapes[k] : boxes[4 * i]
    const cy = round ? edges.shapes[k + 1] : boxes[4 * i + 1]
    const [minX, minY, maxX, maxY] = boxes.subarray(4 * i, 4 * i + 4)
    index.add(Math.min(minX, cx), Math.min(minY, cy), Math.max(maxX, cx), Math.max(maxY, cy))
  }
  index.finish()
  const jet = newJet()
  return (x, y, radius) => {
    let best: Snap | null = null
    const offer = (kind: Snap['kind'], px: number, py: number, edge: number) => {
      const distance = Math.hypot(px - x, py - y)
      if (distance > radius) return
      if (best && (RANK[kind] > RANK[best.kind] || (RANK[kind] === RANK[best.kind] && distance >= best.distance))) return
      best = { kind, x: px, y: py, edge, distance }
    }
    for (const i of index.search(x - radius, y - radius, x + radius, y + radius).sort((a, b) => a - b)) {
      const k = edges.shape[i]
      offer('end', edges.ends[4 * i], edges.ends[4 * i + 1], i)
      offer('end', edges.ends[4 * i + 2], edges.ends[4 * i + 3], i)
      jetAt(edges, i, 0.5, jet)
      offer('middle', jet.x, jet.y, i)
      if (edges.kind[i] === ARC || edges.kind[i] === ELLIPSE) offer('centre', edges.shapes[k], edges.shapes[k + 1], i)
      const near = nearestOn(edges, i, x, y)
      offer('edge', near.x, near.y, i)
    }
    return best
  }
}
