import DxfParser, {
  type IArcEntity,
  type IBlock,
  type ICircleEntity,
  type IEllipseEntity,
  type IEntity,
  type IInsertEntity,
  type ILineEntity,
  type ILwpolylineEntity,
} from 'dxf-parser'
import type { Drawing } from '../dxf/drawing'
import { digits } from './combination'
import { type Affine, bulged, type Curve, compose, conic, curveOf, straight } from './curves'
import { unmatched } from './matching'
import type { Opinion } from './opinion'
import { SAFE_KINDS, whyNotSafe } from './safeSet'

const library = 'dxf-parser'
const NESTING = 32
const TURN = 2 * Math.PI

/** Reads the file again, where the library reads such files right, and compares kinds, counts and coordinates. */
export function dxfParserOpinion(bytes: Uint8Array, drawing: Drawing): Opinion {
  const notAsked = (why: string): Opinion => ({ library, agrees: null, sentence: `Not asked: ${why}.` })
  const text = new TextDecoder('latin1').decode(bytes)
  const why = whyNotSafe(bytes, text)
  if (why) return notAsked(why)
  const theirs: Curve[] = []
  try {
    const file = new DxfParser().parseSync(text)
    if (!file) return notAsked('it found no drawing')
    const here: Affine = [1, 0, 0, 1, 0, 0]
    for (const entity of file.entities) if (!entity.inPaperSpace) pushCurves(theirs, entity, here, file.blocks ?? {}, NESTING)
  } catch (error) {
    return notAsked(`it gave up (${error instanceof Error ? error.message : String(error)})`)
  }
  const ours = curvesOf(drawing)
  const size = Math.max(1e-300, ...ours.flatMap((curve) => curve.map(Math.abs)).slice(0, 60_000))
  const tolerance = 1e-9 * size
  const isLong = ([ax, ay, mx, my]: Curve) => Math.hypot(ax - mx, ay - my) > tolerance
  const left = unmatched(ours.filter(isLong), theirs.filter(isLong), tolerance)
  if (left.ours.length + left.theirs.length === 0) {
    const others = otherKinds(drawing)
    if (ours.length === 0) return notAsked(`it does not read ${others.join(', ') || 'anything in this file'}`)
    const beside = others.length > 0 ? ` (${others.join(', ')} not compared)` : ''
    return { library, agrees: true, sentence: `Read again: ${ours.length} edges agree in kind, number and coordinates${beside}.` }
  }
  const [x, y] = [...left.ours, ...left.theirs][0]
  const sentence = `Read again, ${left.ours.length} of ${ours.length} edges are not found there and ${left.theirs.length} others are, the first near (${digits(x)}, ${digits(y)}).`
  return { library, agrees: false, sentence }
}

function curvesOf({ edges, entities, kinds }: Drawing): Curve[] {
  const curves: Curve[] = []
  for (let i = 0; i < edges.count; i++) {
    const entity = edges.source[i]
    if (entities.space[entity] !== 0 || !SAFE_KINDS.has(kinds[entities.kind[entity]])) continue
    const curve = curveOf(edges, i)
    if (curve) curves.push(curve)
  }
  return curves
}

/** Kinds in model space that gave edges and that the library is not asked about. */
function otherKinds({ edges, entities, kinds }: Drawing): string[] {
  const found = new Set<string>()
  for (let i = 0; i < edges.count; i++) {
    const entity = edges.source[i]
    if (entities.space[entity] === 0) found.add(kinds[entities.kind[entity]])
  }
  return [...found].filter((kind) => !SAFE_KINDS.has(kind))
}

function pushCurves(curves: Curve[], entity: IEntity, at: Affine, blocks: Record<string, IBlock>, nesting: number): void {
  switch (entity.type) {
    case 'LINE': {
      const [a, b] = (entity as ILineEntity).vertices
      curves.push(straight(at, a.x, a.y, b.x, b.y))
      break
    }
    case 'ARC': {
      const { center, radius, startAngle, endAngle } = entity as IArcEntity
      curves.push(conic(at, [center.x, center.y], [radius, 0], [0, radius], startAngle, sweepOf(startAngle, endAngle)))
      break
    }
    case 'CIRCLE': {
      const { center, radius } = entity as ICircleEntity
      curves.push(conic(at, [center.x, center.y], [radius, 0], [0, radius], 0, TURN))
      break
    }
    case 'ELLIPSE': {
      const { center, majorAxisEndPoint: u, axisRatio, startAngle, endAngle } = entity as IEllipseEntity
      const v: [number, number] = [-axisRatio * u.y, axisRatio * u.x]
      curves.push(conic(at, [center.x, center.y], [u.x, u.y], v, startAngle, sweepOf(startAngle, endAngle)))
      break
    }
    case 'LWPOLYLINE': {
      const { vertices, shape } = entity as ILwpolylineEntity
      for (let j = 0; j < vertices.length - (shape ? 0 : 1); j++) {
        const a = vertices[j]
        const b = vertices[(j + 1) % vertices.length]
        curves.push(a.bulge ? bulged(at, a.x, a.y, b.x, b.y, a.bulge) : straight(at, a.x, a.y, b.x, b.y))
      }
      break
    }
    case 'INSERT':
      pushInsert(curves, entity as IInsertEntity, at, blocks, nesting)
  }
}

function sweepOf(start: number, end: number): number {
  const sweep = (end - start) % TURN
  return sweep <= 1e-12 ? sweep + TURN : sweep
}

function pushInsert(curves: Curve[], insert: IInsertEntity, at: Affine, blocks: Record<string, IBlock>, nesting: number): void {
  const block = Object.entries(blocks).find(([name]) => name.toLowerCase() === insert.name.toLowerCase())?.[1]
  if (!block?.entities || nesting === 0) return
  const { x, y } = insert.position
  const turn = ((insert.rotation || 0) * Math.PI) / 180
  const [cos, sin] = [Math.cos(turn), Math.sin(turn)]
  const [sx, sy] = [insert.xScale ?? 1, insert.yScale ?? 1]
  const base = block.position ?? { x: 0, y: 0 }
  for (let row = 0; row < (insert.rowCount || 1); row++) {
    for (let column = 0; column < (insert.columnCount || 1); column++) {
      const dx = column * (insert.columnSpacing || 0)
      const dy = row * (insert.rowSpacing || 0)
      const placed: Affine = [cos * sx, sin * sx, -sin * sy, cos * sy, x + cos * dx - sin * dy, y + sin * dx + cos * dy]
      const inner = compose(at, compose(placed, [1, 0, 0, 1, -base.x, -base.y]))
      for (const entity of block.entities) pushCurves(curves, entity, inner, blocks, nesting - 1)
    }
  }
}
