/** Kinds that dxf-parser reads right (measured on about 50 inputs made for it). */
export const SAFE_KINDS = new Set(['LINE', 'ARC', 'CIRCLE', 'ELLIPSE', 'LWPOLYLINE', 'INSERT'])
/** Kinds that hang it or that it loses figures of, so that the file as a whole is not put to it. */
const UNSAFE_KINDS = new Set(['POLYLINE', 'VERTEX', 'SEQEND', 'ATTRIB', 'ATTDEF', '3DFACE'])
const MOST_BYTES = 4 * 1024 * 1024

/** Why dxf-parser is not asked about this file; null where it lies inside the set that it reads right. */
export function whyNotSafe(bytes: Uint8Array, text: string): string | null {
  if (bytes.length > MOST_BYTES) return `the file is larger than ${MOST_BYTES / 1024 ** 2} MiB`
  if (text.startsWith('AutoCAD Binary DXF')) return 'it reads no binary files'
  const lines = text.split(/\r\n|\r|\n/)
  let section = ''
  let table = ''
  let kind = ''
  for (let n = 0; n + 1 < lines.length; n += 2) {
    const code = lines[n].trim()
    const value = lines[n + 1].trim()
    if (!/^-?\d+$/.test(code)) return `line ${n + 1} is no group code`
    if (code === '999') return 'a comment in the file overwrites values in it'
    if (code === '2' && kind === 'SECTION') section = value
    if (code === '2' && kind === 'TABLE') table = value
    if (code === '0') {
      kind = value
      const odd = section === 'TABLES' && table === 'LAYER' && !['TABLE', 'LAYER', 'ENDTAB'].includes(kind)
      if (odd) return 'its layer table holds other records'
      if (kind === 'ENDTAB') table = ''
    }
    const entity = section === 'ENTITIES' || section === 'BLOCKS'
    if (!entity) continue
    if (UNSAFE_KINDS.has(kind)) return `it does not read ${kind} reliably`
    const flat = code === '210' || code === '220' ? Number(value) === 0 : code !== '230' || Number(value) === 1
    if (SAFE_KINDS.has(kind) && !flat) return 'it ignores extrusion directions'
    if (kind === 'LWPOLYLINE' && code === '91') return 'it loses vertices that carry identifiers'
  }
  return null
}
