import { DEFAULT_RECIPE } from '../geometry/recipe'
import { askOthers } from '../opinions/askOthers'
import { readTask, sectionTask } from './tasks'

const ROUNDS = 3
const corners = [
  [10, 0, 0],
  [90, 0, 0.414],
  [100, 10, 0],
  [100, 60, 0],
  [0, 60, 0],
  [0, 10, 0.414],
]
const vertices = corners.map(([x, y, bulge]) => `10\n${x}\n20\n${y}\n42\n${bulge}\n`).join('')
const SAMPLE = `0\nSECTION\n2\nENTITIES\n0\nLWPOLYLINE\n8\n0\n90\n${corners.length}\n70\n1\n${vertices}0\nCIRCLE\n8\n0\n10\n50\n20\n30\n40\n12\n0\nENDSEC\n0\nEOF\n`

/** Runs a sample through every step, so that the first real job finds the code compiled. */
export function warmUp(): void {
  const bytes = new TextEncoder().encode(SAMPLE)
  const source = { name: 'sample.dxf', bytes: bytes.length, sha256: '' }
  for (let round = 0; round < ROUNDS; round++) {
    const drawing = readTask(bytes)
    const { combination } = sectionTask(drawing, source, DEFAULT_RECIPE, {})
    askOthers(bytes, drawing, combination)
  }
}
