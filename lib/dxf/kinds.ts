/** Entity kinds that give edges or stand for one that could not be read. The order is their number. */
export const KINDS = ['LINE', 'ARC', 'CIRCLE', 'ELLIPSE', 'LWPOLYLINE', 'POLYLINE', 'SPLINE', 'INSERT', 'HATCH'] as const
export type Kind = (typeof KINDS)[number]

export const LINE_KIND = 0
export const ARC_KIND = 1
export const CIRCLE_KIND = 2
export const ELLIPSE_KIND = 3
export const LWPOLYLINE_KIND = 4
export const POLYLINE_KIND = 5
export const SPLINE_KIND = 6
export const INSERT_KIND = 7
export const HATCH_KIND = 8

/** Records that the reader knows besides, numbered after the kinds above. */
export const MARKS = ['VERTEX', 'SEQEND', 'DIMENSION', 'SECTION', 'ENDSEC', 'EOF', 'BLOCK', 'ENDBLK', 'LAYER', 'LTYPE'] as const
export const MORE_MARKS = ['BLOCK_RECORD', 'DIMSTYLE', 'LAYOUT', 'TABLE', 'ENDTAB', 'ATTRIB', 'VIEWPORT', 'OTHER'] as const
export const ALL_KINDS: readonly string[] = [...KINDS, ...MARKS, ...MORE_MARKS]
export const kindNumber = (name: (typeof KINDS)[number] | (typeof MARKS)[number] | (typeof MORE_MARKS)[number]): number =>
  ALL_KINDS.indexOf(name)

/** Kinds that may be metal and are not read: named in a warning instead of a note. */
export const PERHAPS_METAL = new Set([
  'REGION',
  '3DSOLID',
  'BODY',
  'SURFACE',
  'EXTRUDEDSURFACE',
  'PLANESURFACE',
  'MLINE',
  'HELIX',
  'SOLID',
  'TRACE',
  '3DFACE',
  'MESH',
  'ACAD_PROXY_ENTITY',
  'PROXY',
  'WIPEOUT',
  'IMAGE',
  'OLE2FRAME',
  'PDFUNDERLAY',
  'DWFUNDERLAY',
  'DGNUNDERLAY',
])
