import { facesOf } from './arrangement/faces'
import { chordLength } from './chordLength'
import type { ClosedLoops } from './closedLoops'
import { loopArea } from './edgeArea'
import { type EdgeTable, pushCopy } from './edges'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import { insideLoop } from './inside'
import { interiorPoint } from './interiorPoint'
import type { Tolerances } from './outlineSet'
import { pruneNet } from './pruneNet'
import type { Bond } from './recipe'

export interface NetOutlines {
  /** for each loop 1 where a person has to decide about it */
  undecided: Uint8Array
  findings: Finding[]
}

/** A face of a net: rows from … to − 1 of its table. */
interface Face {
  edges: EdgeTable
  from: number
  to: number
  area: number
  inside: [number, number]
}

/**
 * Turns nets of branching edges into outlines, appended to `closed`. A net with one face is an outline with loose ends.
 * Of several faces each asks "metal or void?": unanswered ones are outlines that wait for a decision; an answered one is
 * an outline where nesting among the other outlines then gives the answer, and none where its surroundings give it.
 * So do faces between an open chain and the outlines that close it; these outlines stay as drawn.
 */
export function netOutlines(closed: ClosedLoops, tolerances: Tolerances, mmPerUnit: number, bonds: Bond[]): NetOutlines {
  const findings: Finding[] = []
  const { edges, loopStart } = closed
  const drawn = loopStart.length - 1
  const undecided: number[] = new Array(drawn).fill(0)
  const take = ({ edges: from, from: first, to }: Face, waits: 0 | 1) => {
    for (let i = first; i < to; i++) pushCopy(edges, from, i)
    loopStart.push(edges.count)
    undecided.push(waits)
  }
  const ask = (face: Face) => {
    const [x, y] = face.inside
    const params = { area: face.area * mmPerUnit ** 2, x, y }
    const size = Math.sqrt(face.area)
    const answer = bonds.find(({ at }) => insideLoop(face.edges, face.from, face.to, at[0], at[1]))
    if (!answer || answer.is === 'contact') {
      take(face, 1)
      findings.push(geometryFinding('face-metal-or-void', params, face.inside, size))
      return
    }
    const metal = answer.is !== 'void'
    const even = holding(closed, drawn, x, y).length % 2 === 0
    if (metal === even) take(face, 0)
    findings.push(geometryFinding('face-answered', { ...params, is: metal ? 'metal' : 'void' }, face.inside, size))
  }
  for (const net of closed.nets) {
    const { net: closing, pruned } = pruneNet(net, tolerances.snap)
    const found = closing.count > 0 ? facesIn(closing, tolerances) : NO_FACES
    const { faces, tooMany } = found
    const dangling = pruned + found.dangling
    if (tooMany || dangling > 0 || faces.length === 0) {
      const at: [number, number] = [net.ends[0], net.ends[1]]
      const code = tooMany ? 'crossings-too-many' : 'branches'
      findings.push(geometryFinding(code, { edges: tooMany ? net.count : dangling, x: at[0], y: at[1] }, at))
    }
    if (faces.length === 1) take(faces[0], 0)
    else for (const face of faces) ask(face)
  }
  const faces = closed.onLoops ? facesIn(closed.onLoops, tolerances).faces : []
  for (const face of faces) if (!isDrawn(closed, drawn, face, tolerances.chaining)) ask(face)
  return { undecided: Uint8Array.from(undecided), findings }
}

const NO_FACES = { faces: [], dangling: 0, tooMany: false }

function facesIn(net: EdgeTable, tolerances: Tolerances): { faces: Face[]; dangling: number; tooMany: boolean } {
  const { edges, loopStart, area, dangling, tooMany } = facesOf(net, null, tolerances)
  const faces: Face[] = []
  for (let k = 0; k < area.length; k++) {
    const inside = interiorPoint(edges, loopStart[k], loopStart[k + 1])
    if (inside) faces.push({ edges, from: loopStart[k], to: loopStart[k + 1], area: area[k], inside })
  }
  return { faces, dangling: dangling.length, tooMany }
}

/** Which of the outlines drawn as such hold a point. */
function holding({ edges, loopStart }: ClosedLoops, drawn: number, x: number, y: number): number[] {
  return Array.from({ length: drawn }, (_, k) => k).filter((k) => insideLoop(edges, loopStart[k], loopStart[k + 1], x, y))
}

/** Whether a face is an outline that was drawn as such. */
function isDrawn(closed: ClosedLoops, drawn: number, { edges: own, inside, area, from, to }: Face, tolerance: number): boolean {
  const { edges, loopStart } = closed
  const allowed = tolerance * chordLength(own, from, to)
  return holding(closed, drawn, ...inside).some(
    (k) => Math.abs(loopArea(edges, loopStart[k], loopStart[k + 1]) - area) <= allowed,
  )
}
