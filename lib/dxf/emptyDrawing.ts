import { emptyTable } from '../geometry/edges'
import type { Finding } from '../geometry/finding'
import type { Drawing } from './drawing'
import { emptyEntities } from './entityTable'
import { KINDS } from './kinds'

/** The drawing of a file that is none, with the finding that says so. */
export const emptyDrawing = (finding: Finding): Drawing => ({
  acadVersion: '',
  declared: 'none',
  declaredMm: null,
  measurement: null,
  layers: [],
  lineTypes: [],
  spaces: ['model'],
  blocks: [],
  kinds: [...KINDS],
  entities: emptyEntities(0),
  edges: emptyTable(0, 0),
  read: {},
  ignored: {},
  dimensions: [],
  lastDigit: 0,
  findings: [finding],
  findingsTotal: 1,
  remarks: [],
})
