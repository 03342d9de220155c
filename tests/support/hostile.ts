/**
 * Broken, hostile and absurd inputs. Each either gives no section and a sentence that matches `says`,
 * or is merely odd and must be read right (`area`, mm²). Used against the engine and the upload route.
 */
export interface HostileInput {
  name: string
  file: string
  bytes: Uint8Array
  expects: { says: RegExp } | { area: number }
}

const ascii = (text: string): Uint8Array => new TextEncoder().encode(text)
const tags = (...list: [number, string | number][]): string => list.map(([code, value]) => `${code}\n${value}\n`).join('')
const section = (name: string, content: string): string => `${tags([0, 'SECTION'], [2, name])}${content}${tags([0, 'ENDSEC'])}`
const whole = (entities: string, { before = '', unit = 4 }: { before?: string; unit?: number } = {}): string =>
  section('HEADER', tags([9, '$ACADVER'], [1, 'AC1015'], [9, '$INSUNITS'], [70, unit])) +
  before +
  section('ENTITIES', entities) +
  tags([0, 'EOF'])

const line = (x0: number | string, y0: number | string, x1: number | string, y1: number | string, layer = '0'): string =>
  tags([0, 'LINE'], [8, layer], [10, x0], [20, y0], [11, x1], [21, y1])
const rectangle = (layer = '0', w: number | string = 60, h: number | string = 40): string =>
  line(0, 0, w, 0, layer) + line(w, 0, w, h, layer) + line(w, h, 0, h, layer) + line(0, h, 0, 0, layer)
const lwpolyline = (
  points: (number | string)[][],
  { count = points.length, extra = '' }: { count?: number | null; extra?: string } = {},
): string =>
  tags([0, 'LWPOLYLINE'], [8, '0']) +
  (count === null ? '' : tags([90, count])) +
  tags([70, 1]) +
  extra +
  points.map(([x, y]) => tags([10, x], [20, y])).join('')
const circle = (x: number, y: number, r: number | string | null): string =>
  tags([0, 'CIRCLE'], [8, '0'], [10, x], [20, y]) + (r === null ? '' : tags([40, r]))
const block = (name: string, content: string): string =>
  tags([0, 'BLOCK'], [8, '0'], [2, name], [10, 0], [20, 0]) + content + tags([0, 'ENDBLK'], [8, '0'])
const insert = (name: string, ...extra: [number, string | number][]): string =>
  tags([0, 'INSERT'], [8, '0'], [2, name], [10, 0], [20, 0], ...extra)
const spline = (degree: number, knots: (number | string)[], control: number[][], weights: number[] = []): string =>
  tags([0, 'SPLINE'], [8, '0'], [70, weights.length ? 12 : 8], [71, degree], [72, knots.length], [73, control.length], [74, 0]) +
  knots.map((k) => tags([40, k])).join('') +
  weights.map((w) => tags([41, w])).join('') +
  control.map(([x, y]) => tags([10, x], [20, y])).join('')
const tall = [
  [0, 0],
  [60, 0],
  [60, 40],
  [0, 40],
]

const good = whole(rectangle())
const cut = (text: string, mark: string, extra = 0): string => text.slice(0, text.indexOf(mark) + extra)

type Row = [name: string, bytes: Uint8Array | string, expects: RegExp | number, file?: string]

/** Other file kinds and no file at all. */
const otherKinds: Row[] = [
  ['an empty file', '', /empty/i],
  ['one byte', '0', /not a DXF|ends|DXF/i],
  ['blank lines only', '\n \n\t\n'.repeat(200), /DXF|empty/i],
  ['a DWG', new Uint8Array([...ascii('AC1032'), ...new Array(500).fill(0)]), /DWG/],
  ['a PDF', '%PDF-1.7\n%âãÏÓ\n1 0 obj\n<<>>\nendobj\n', /PDF/],
  ['a ZIP', new Uint8Array([0x50, 0x4b, 3, 4, ...new Array(200).fill(7)]), /ZIP/i],
  ['a PNG', new Uint8Array([0x89, 0x50, 0x4e, 0x47, 13, 10, 26, 10, ...new Array(100).fill(1)]), /PNG|picture|image/i],
  ['a JPEG', new Uint8Array([0xff, 0xd8, 0xff, 0xe0, ...new Array(100).fill(1)]), /JPEG|picture|image/i],
  ['a STEP file', "ISO-10303-21;\nHEADER;\nFILE_DESCRIPTION((''),'2;1');\nENDSEC;\n", /STEP/],
  ['an SVG', '<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg"><path d="M0 0h60v40h-60z"/></svg>', /SVG/],
  ['an HTML page', '<!doctype html><html><body>Sign in</body></html>', /HTML/],
  ['a JSON file', '{"entities": []}', /DXF/],
  ['a text', 'Dear Sirs,\nplease find the drawing attached.\nRegards\n', /DXF/],
  ['a program', new Uint8Array([0x7f, 0x45, 0x4c, 0x46, ...new Array(300).fill(0)]), /DXF/],
  ['a megabyte of zeros', new Uint8Array(1_000_000), /DXF/],
  ['five megabytes without a line end', 'A'.repeat(5_000_000), /DXF/],
  ['every byte value in turn', Uint8Array.from({ length: 65536 }, (_, i) => (i * 167) & 255), /DXF/],
]

/** Files that end too early. */
const truncated: Row[] = [
  ['a file cut in a number', cut(good, '11\n60', 4), /cut|ends|truncated/i],
  ['a file cut after a group code', cut(good, '11\n60', 3), /cut|ends|truncated/i],
  ['a file cut in the header', cut(good, '$INSUNITS', 4), /cut|ends|truncated|no outline|ENTITIES/i],
  ['a file without EOF and ENDSEC', cut(good, '0\nENDSEC\n0\nEOF'), /cut|ends|truncated/i],
  ['a polyline cut in its vertices', cut(whole(lwpolyline(tall)), '10\n60\n20\n40', 6), /cut|ends|truncated/i],
]

/** Numbers that are none, and entities that do not determine anything. */
const numbers: Row[] = [
  ['a coordinate with a unit', whole(rectangle('0', '60mm')), /60mm/],
  ['a decimal comma', whole(rectangle('0', '60,5')), /60,5/],
  ['NaN as a coordinate', whole(rectangle('0', 'NaN')), /NaN/],
  ['an overflowing coordinate', whole(rectangle('0', '1e999')), /1e999/],
  ['two minus signs', whole(rectangle('0', '--60')), /--60/],
  ['a hexadecimal coordinate', whole(rectangle('0', '0x3C')), /0x3C/],
  ['an empty coordinate', whole(rectangle('0', '')), /number|empty/i],
  ['a circle without a radius', whole(circle(0, 0, null)), /radius/i],
  ['a circle of radius 0', whole(circle(0, 0, 0)), /radius/i],
  ['a circle of negative radius', whole(circle(0, 0, -5)), /radius/i],
  ['a line without its second point', whole(rectangle() + tags([0, 'LINE'], [8, '0'], [10, 1], [20, 1])), /LINE/],
  ['coordinates of 1e300', whole(rectangle('0', '1e300', '1e300')), /large|range|size|limit/i],
  ['a polyline that says 9 vertices and has 4', whole(lwpolyline(tall, { count: 9 })), /9/],
  ['a polyline that says 2 vertices and has 4', whole(lwpolyline(tall, { count: 2 })), /2/],
  ['a polyline of one vertex', whole(lwpolyline([[0, 0]])), /outline|vert/i],
  [
    'a polyline whose vertex has no y',
    whole(tags([0, 'LWPOLYLINE'], [8, '0'], [90, 3], [70, 1], [10, 0], [20, 0], [10, 60], [10, 60], [20, 40])),
    /vertex|y/i,
  ],
  [
    'an ellipse of ratio 0',
    whole(tags([0, 'ELLIPSE'], [8, '0'], [10, 0], [20, 0], [11, 30], [21, 0], [40, 0], [41, 0], [42, 6.283185307179586])),
    /ratio|ELLIPSE/i,
  ],
  [
    'an ellipse without a major axis',
    whole(tags([0, 'ELLIPSE'], [8, '0'], [10, 0], [20, 0], [40, 0.5], [41, 0], [42, 6.283185307179586])),
    /axis|ELLIPSE/i,
  ],
]

/** Splines that are none. */
const cubic = [
  [0, 0],
  [0, 30],
  [60, 30],
  [60, 0],
]
const splines: Row[] = [
  ['decreasing knots', whole(spline(3, [0, 0, 0, 0, 1, 1, 0.5, 1], cubic)), /knot/i],
  ['too few knots', whole(spline(3, [0, 0, 0, 1, 1], cubic)), /knot/i],
  ['a weight of 0', whole(spline(3, [0, 0, 0, 0, 1, 1, 1, 1], cubic, [1, 0, 1, 1])), /weight/i],
  ['a negative weight', whole(spline(3, [0, 0, 0, 0, 1, 1, 1, 1], cubic, [1, -1, 1, 1])), /weight/i],
  ['degree 0', whole(spline(0, [0, 1, 2, 3, 4], cubic)), /degree/i],
  ['degree 1000', whole(spline(1000, [0, 1], cubic)), /degree/i],
  ['no control points', whole(spline(3, [], [])), /control|spline/i],
]

/** Blocks that point at themselves, at nothing, or at too much. */
const nest = (levels: number, each: number): string =>
  section(
    'BLOCKS',
    Array.from({ length: levels }, (_, i) =>
      block(`B${i}`, i === levels - 1 ? rectangle() : insert(`B${i + 1}`).repeat(each)),
    ).join(''),
  )
const blocks: Row[] = [
  [
    'a block that places itself',
    whole(insert('A'), { before: section('BLOCKS', block('A', insert('A') + rectangle())) }),
    /itself/i,
  ],
  [
    'two blocks that place each other',
    whole(insert('A'), { before: section('BLOCKS', block('A', insert('B')) + block('B', insert('A'))) }),
    /itself|each other|circle/i,
  ],
  ['a block that is not there', whole(insert('NOWHERE')), /NOWHERE/],
  ['blocks nested 200 deep', whole(insert('B0'), { before: nest(200, 1) }), /nest|deep/i],
  ['ten levels of ten blocks each', whole(insert('B0'), { before: nest(10, 10) }), /2[, ]?000[, ]?000|entities/i],
  [
    'an array of 100,000 by 100,000',
    whole(insert('A', [70, 100000], [71, 100000], [44, 1], [45, 1]), { before: section('BLOCKS', block('A', rectangle())) }),
    /entities|array/i,
  ],
  ['an insert of scale 0', whole(insert('A', [41, 0]), { before: section('BLOCKS', block('A', rectangle())) }), /scale/i],
]

/** Not in the plane. */
const plane: Row[] = [
  [
    'a circle seen from the side',
    whole(tags([0, 'CIRCLE'], [8, '0'], [10, 0], [20, 0], [40, 20], [210, 0], [220, 1], [230, 0])),
    /tilt|plane|extrusion|turned/i,
  ],
  [
    'a direction of no length',
    whole(tags([0, 'CIRCLE'], [8, '0'], [10, 0], [20, 0], [40, 20], [210, 0], [220, 0], [230, 0])),
    /extrusion|direction|tilt/i,
  ],
  [
    'a polyface mesh',
    whole(
      tags([0, 'POLYLINE'], [8, '0'], [66, 1], [70, 64]) +
        tags([0, 'VERTEX'], [8, '0'], [10, 0], [20, 0], [70, 192]) +
        tags([0, 'SEQEND']),
    ),
    /mesh|polyface/i,
  ],
]

/** Outlines that give no section. */
const crossing = Array.from({ length: 1500 }, (_, i) => line(i, -1, i, 1501) + line(-1, i, 1501, i)).join('')
const outlines: Row[] = [
  ['no entities', whole(''), /outline|nothing/i],
  ['only a text', whole(tags([0, 'TEXT'], [8, '0'], [10, 0], [20, 0], [40, 5], [1, 'PROFILE'])), /outline/i],
  [
    'an outline left open by 5 mm',
    whole(line(0, 0, 60, 0) + line(60, 0, 60, 40) + line(60, 40, 0, 40) + line(0, 40, 0, 5)),
    /open|gap/i,
  ],
  ['lines of no length', whole(line(5, 5, 5, 5).repeat(4)), /outline|length/i],
  [
    'two rectangles that cross',
    whole(
      lwpolyline(tall) +
        lwpolyline([
          [30, 20],
          [90, 20],
          [90, 60],
          [30, 60],
        ]),
    ),
    /cross/i,
  ],
  ['1,500 lines across 1,500 lines', whole(crossing), /./],
  [
    'an outline out and back on itself',
    whole(
      lwpolyline([
        [0, 0],
        [60, 0],
        [60, 40],
        [60, 0],
      ]),
    ),
    /area|outline|itself|width|no section/i,
  ],
]

/** Odd, and to be read right: 60 × 40 mm unless said. */
const comments = good.replace(/\n0\nLINE/g, '\n999\na remark, 1,5 and $INSUNITS\n0\nLINE')
const odd: Row[] = [
  ['line ends of a PC', good.replace(/\n/g, '\r\n'), 2400],
  ['line ends of an old Mac', good.replace(/\n/g, '\r'), 2400],
  ['mixed line ends', good.replace(/\n/g, (_, i: number) => (i % 3 ? '\n' : '\r\n')), 2400],
  ['a byte-order mark', `\uFEFF${good}`, 2400],
  ['padded group codes', good.replace(/^(\d+)\n/gm, '  $1\n'), 2400],
  ['comments everywhere', comments, 2400],
  ['entities without a section', rectangle() + tags([0, 'EOF']), 2400],
  ['text after EOF', `${good}\nthis is not read\n`, 2400],
  ['a layer called __proto__', whole(rectangle('__proto__')), 2400],
  ['a layer that is a script', whole(rectangle('<script>alert(1)</script>')), 2400],
  ['a layer that is a formula', whole(rectangle('=HYPERLINK("http://x")')), 2400],
  ['a layer of 100,000 letters', whole(rectangle('L'.repeat(100_000))), 2400],
  ['a layer with control characters', whole(rectangle('A\u0007\u202EB\u0000C')), 2400],
  [
    'POLYLINE without SEQEND',
    whole(
      tags([0, 'POLYLINE'], [8, '0'], [66, 1], [70, 1]) +
        tall.map(([x, y]) => tags([0, 'VERTEX'], [8, '0'], [10, x], [20, y])).join(''),
    ),
    2400,
  ],
  [
    'a layer table that never ends',
    whole(rectangle(), {
      before: tags(
        [0, 'SECTION'],
        [2, 'TABLES'],
        [0, 'TABLE'],
        [2, 'LAYER'],
        [70, 1],
        [0, 'LAYER'],
        [2, 'A'],
        [70, 0],
        [0, 'ENDSEC'],
      ),
    }),
    2400,
  ],
  ['polyline vertices with ids', whole(lwpolyline(tall).replace(/10\n/g, '91\n7\n10\n').replace('91\n7\n', '')), 2400],
  ['a polyline without a count', whole(lwpolyline(tall, { count: null })), 2400],
  [
    'two ENTITIES sections',
    section('ENTITIES', line(0, 0, 60, 0) + line(60, 0, 60, 40)) +
      section('ENTITIES', line(60, 40, 0, 40) + line(0, 40, 0, 0)) +
      tags([0, 'EOF']),
    2400,
  ],
  ['the same rectangle drawn fifty times', whole(rectangle().repeat(50)), 2400],
  ['an unknown unit code', whole(rectangle(), { unit: 99 }), 2400],
  ['a file name that climbs', good, 2400, '../../../etc/passwd.dxf'],
  ['a file name with quotes and line ends', good, 2400, 'a"b\'c;<x>\r\nX-Evil: 1.dxf'],
  ['a file name of 300 letters', good, 2400, `${'n'.repeat(300)}.dxf`],
  ['a file name that is a formula', good, 2400, '=1+1.dxf'],
]

export const HOSTILE: HostileInput[] = [otherKinds, truncated, numbers, splines, blocks, plane, outlines, odd]
  .flat()
  .map(([name, bytes, expects, file = 'drawing.dxf']) => ({
    name,
    file,
    bytes: typeof bytes === 'string' ? ascii(bytes) : bytes,
    expects: typeof expects === 'number' ? { area: expects } : { says: expects },
  }))
