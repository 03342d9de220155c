import type { ClosedLoops } from './closedLoops'
import type { Finding } from './finding'
import { geometryFinding } from './findings'
import type { Tolerances } from './outlineSet'
import type { Bond } from './recipe'

export interface NetOutlines {
  /** 1 for each loop that a person has to decide about */
  undecided: Uint8Array
  findings: Finding[]
}

export function netOutlines(closed: ClosedLoops, _tolerances: Tolerances, _mmPerUnit: number, _bonds: Bond[]): NetOutlines {
  const findings = closed.nets.map((net) => {
    const at: [number, number] = [net.ends[0], net.ends[1]]
    return geometryFinding('branches', { edges: net.count, x: at[0], y: at[1] }, at)
  })
  return { undecided: new Uint8Array(closed.loopStart.length - 1), findings }
}
