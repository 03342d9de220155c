import { readFileSync } from 'node:fs'
import path from 'node:path'
import type { Drawing, ReadLimits } from '@/lib/dxf/drawing'
import { readDrawing } from '@/lib/dxf/read'
import { type Selecting, type Selection, selectEdges } from '@/lib/dxf/select'
import { type Edge, edgeAt } from '@/lib/geometry/edges'
import type { Finding } from '@/lib/geometry/finding'

type Group = [code: number, value: string | number]

/** Groups as text. */
export const groups = (...list: Group[]): string => list.map(([code, value]) => `${code}\n${value}\n`).join('')
export const section = (name: string, content: string): string =>
  `${groups([0, 'SECTION'], [2, name])}${content}${groups([0, 'ENDSEC'])}`
export const EOF = groups([0, 'EOF'])

/** A whole file around entities. */
export const drawn = (entities: string, { version = 'AC1015', unit = 4, before = '' } = {}): string =>
  section('HEADER', groups([9, '$ACADVER'], [1, version], [9, '$INSUNITS'], [70, unit])) +
  before +
  section('ENTITIES', entities) +
  EOF

export const entity = (kind: string, ...rest: Group[]): string => groups([0, kind], [8, '0'], ...rest)
export const line = (
  x0: number | string,
  y0: number | string,
  x1: number | string,
  y1: number | string,
  ...rest: Group[]
): string => entity('LINE', [10, x0], [20, y0], [11, x1], [21, y1], ...rest)
export const circle = (x: number, y: number, r: number | string, ...rest: Group[]): string =>
  entity('CIRCLE', [10, x], [20, y], [40, r], ...rest)
export const insert = (name: string, ...rest: Group[]): string => entity('INSERT', [2, name], [10, 0], [20, 0], ...rest)
export const block = (name: string, content: string, base: [number, number] = [0, 0]): string =>
  entity('BLOCK', [2, name], [10, base[0]], [20, base[1]]) + content + groups([0, 'ENDBLK'])
export const blocks = (...list: string[]): string => section('BLOCKS', list.join(''))
export const table = (kind: string, ...records: Group[][]): string =>
  section(
    'TABLES',
    groups([0, 'TABLE'], [2, kind]) + records.map((r) => groups([0, kind], ...r)).join('') + groups([0, 'ENDTAB']),
  )

export const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text)
export const latin = (text: string): Uint8Array => Uint8Array.from(text, (c) => c.charCodeAt(0))

/** Reads the text of a file. */
export const read = (text: string | Uint8Array, limits?: ReadLimits): Drawing =>
  readDrawing(typeof text === 'string' ? bytesOf(text) : text, limits)

const DEFAULTS: Selecting = { layers: null, lineTypes: null, space: 'model', hatches: false }
export const select = (drawing: Drawing, selecting: Partial<Selecting> = {}): Selection =>
  selectEdges(drawing, { ...DEFAULTS, ...selecting })

/** All that a person is told about a drawing with the default selection. */
export const findingsOf = (drawing: Drawing): Finding[] => [...drawing.findings, ...select(drawing).findings]
export const codesOf = (drawing: Drawing): string[] => findingsOf(drawing).map(({ code }) => code)
export const finding = (drawing: Drawing, code: string): Finding => {
  const found = findingsOf(drawing).find((f) => f.code === code)
  if (!found) throw new Error(`no finding ${code} among: ${codesOf(drawing).join(', ')}`)
  return found
}
export const edgesOf = ({ edges }: Drawing): Edge[] => Array.from({ length: edges.count }, (_, i) => edgeAt(edges, i))
export const endsOf = (drawing: Drawing): number[][] => edgesOf(drawing).map(({ a, b }) => [a.x, a.y, b.x, b.y])

export const fixture = (...name: string[]): Uint8Array =>
  new Uint8Array(readFileSync(path.join(import.meta.dirname, '../../fixtures', ...name)))
