// Draws the demo scenario: fixtures/demo/*.dxf. Run it after a change to a drawing below; the files are committed.
//   node scripts/make-demo.mjs
import { mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const folder = join(import.meta.dirname, '..', 'fixtures', 'demo')
const number = (value) => String(Math.round(value * 1e6) / 1e6)
const pairs = (...list) => list.map(([code, value]) => `${code}\n${typeof value === 'number' ? number(value) : value}\n`).join('')

let handle = 0x30
const entity = (kind, layer, subclass, ...rest) =>
  pairs([0, kind], [5, (handle++).toString(16).toUpperCase()], [100, 'AcDbEntity'], [8, layer], [100, subclass], ...rest)

const line = (layer, x0, y0, x1, y1, extra = []) =>
  entity('LINE', layer, 'AcDbLine', ...extra, [10, x0], [20, y0], [11, x1], [21, y1])
const arc = (layer, x, y, r, from, to) => entity('ARC', layer, 'AcDbCircle', [10, x], [20, y], [40, r], [100, 'AcDbArc'], [50, from], [51, to])
const circle = (layer, x, y, r) => entity('CIRCLE', layer, 'AcDbCircle', [10, x], [20, y], [40, r])
const ellipse = (layer, x, y, mx, my, ratio) =>
  entity('ELLIPSE', layer, 'AcDbEllipse', [10, x], [20, y], [11, mx], [21, my], [40, ratio], [41, '0.0'], [42, String(2 * Math.PI)])
const polyline = (layer, vertices) =>
  entity('LWPOLYLINE', layer, 'AcDbPolyline', [90, vertices.length], [70, 1], ...vertices.flatMap(([x, y, bulge]) => [[10, x], [20, y], ...(bulge ? [[42, bulge]] : [])]))
const spline = (layer, degree, knots, control) =>
  entity('SPLINE', layer, 'AcDbSpline', [70, 8], [71, degree], [72, knots.length], [73, control.length], [74, 0], ...knots.map((k) => [40, k]), ...control.flatMap(([x, y]) => [[10, x], [20, y]]))
const text = (layer, x, y, height, words) => entity('TEXT', layer, 'AcDbText', [10, x], [20, y], [40, height], [1, words], [100, 'AcDbText'])
const insert = (layer, block, x, y, angle = 0, sx = 1, sy = 1) =>
  entity('INSERT', layer, 'AcDbBlockReference', [2, block], [10, x], [20, y], [41, sx], [42, sy], [50, angle])
const dimension = (x0, y0, x1, y1, lx, ly, angle, measured, words = '') =>
  entity('DIMENSION', 'DIM', 'AcDbDimension', [2, ''], [10, lx], [20, ly], [11, (lx + x0) / 2], [21, ly], [70, 32], [1, words], [42, measured], [100, 'AcDbAlignedDimension'], [13, x0], [23, y0], [14, x1], [24, y1], [50, angle], [100, 'AcDbRotatedDimension'])

/** Corners [x, y, r?]: the closed polyline with each corner rounded to its radius. */
function rounded(corners) {
  const n = corners.length
  return corners.flatMap(([x, y, r], i) => {
    if (!r) return [[x, y]]
    const [ax, ay] = corners[(i + n - 1) % n]
    const [bx, by] = corners[(i + 1) % n]
    const a = Math.atan2(ay - y, ax - x)
    const b = Math.atan2(by - y, bx - x)
    let turn = Math.PI - (((b - a) % (2 * Math.PI)) + 2 * Math.PI) % (2 * Math.PI)
    if (turn > Math.PI) turn -= 2 * Math.PI
    const t = r * Math.tan(Math.abs(turn) / 2)
    return [[x + t * Math.cos(a), y + t * Math.sin(a), -Math.tan(turn / 4)], [x + t * Math.cos(b), y + t * Math.sin(b)]]
  })
}
const box = (x0, y0, x1, y1, r = 0) => rounded([[x0, y0, r], [x1, y0, r], [x1, y1, r], [x0, y1, r]])

/** The same closed polyline as loose LINEs and ARCs. */
function loose(layer, vertices) {
  return vertices.map(([x0, y0, bulge], i) => {
    const [x1, y1] = vertices[(i + 1) % vertices.length]
    if (!bulge) return line(layer, x0, y0, x1, y1)
    const k = (1 - bulge * bulge) / (4 * bulge)
    const cx = (x0 + x1) / 2 - k * (y1 - y0)
    const cy = (y0 + y1) / 2 + k * (x1 - x0)
    const degrees = (x, y) => ((Math.atan2(y - cy, x - cx) * 180) / Math.PI + 360) % 360
    const [from, to] = bulge > 0 ? [degrees(x0, y0), degrees(x1, y1)] : [degrees(x1, y1), degrees(x0, y0)]
    return arc(layer, cx, cy, Math.hypot(x0 - cx, y0 - cy), from, to)
  }).join('')
}

function drawing(name, entities, { units = 4, version = 'AC1015', blocks = '', layers = ['PROFILE', 'DIM', 'CENTRE', 'TEXT'] } = {}) {
  const table = layers.map((layer) => pairs([0, 'LAYER'], [100, 'AcDbSymbolTableRecord'], [100, 'AcDbLayerTableRecord'], [2, layer], [70, 0], [62, 7], [6, layer === 'CENTRE' ? 'CENTER' : 'CONTINUOUS'])).join('')
  writeFileSync(join(folder, `${name}.dxf`), [
    pairs([0, 'SECTION'], [2, 'HEADER'], [9, '$ACADVER'], [1, version], [9, '$INSUNITS'], [70, String(units)], [0, 'ENDSEC']),
    pairs([0, 'SECTION'], [2, 'TABLES'], [0, 'TABLE'], [2, 'LAYER'], [70, String(layers.length)]), table, pairs([0, 'ENDTAB'], [0, 'ENDSEC']),
    blocks && pairs([0, 'SECTION'], [2, 'BLOCKS']) + blocks + pairs([0, 'ENDSEC']),
    pairs([0, 'SECTION'], [2, 'ENTITIES']), entities, pairs([0, 'ENDSEC'], [0, 'EOF']),
  ].join(''))
}
const block = (name, content) => pairs([0, 'BLOCK'], [8, '0'], [2, name], [70, '0'], [10, 0], [20, 0]) + content + pairs([0, 'ENDBLK'], [8, '0'])

mkdirSync(folder, { recursive: true })

// Mullion 60 × 118: two chambers and a glazing groove, one closed polyline each, with the order's dimensions drawn.
const mullion = (layer, dx, dy) => {
  const at = (v) => v.map(([x, y, b]) => [x + dx, y + dy, b])
  return polyline(layer, at(rounded([[-30, 0, 1], [30, 0, 1], [30, 90, 0.6], [8, 90, 0.5], [8, 118, 0.4], [3, 118, 0.4], [3, 100, 0.3], [-3, 100, 0.3], [-3, 118, 0.4], [-8, 118, 0.4], [-8, 90, 0.5], [-30, 90, 0.6]])))
    + polyline(layer, at(box(-27.4, 2.6, 27.4, 43, 1))) + polyline(layer, at(box(-27.4, 45.2, 27.4, 87.4, 1)))
}
drawing('mullion-60x118', mullion('PROFILE', 0, 0) + dimension(-30, 0, 30, 0, 30, -12, 0, 60) + dimension(30, 0, 30, 118, 46, 118, 90, 118)
  + line('CENTRE', 0, -8, 0, 126) + text('TEXT', -30, -28, 4, 'MULLION 60 x 118, 6060 T66'))

// Transom with a drip edge: unsymmetric, so that its principal axes are turned.
drawing('transom-60x74', polyline('PROFILE', rounded([[0, 0, 0.8], [85, 0, 0.8], [85, 3, 0.8], [60, 3, 1.5], [60, 60, 0.6], [40, 60, 0.5], [40, 74, 0.4], [36, 74, 0.4], [36, 64, 0.3], [24, 64, 0.3], [24, 74, 0.4], [20, 74, 0.4], [20, 60, 0.5], [0, 60, 0.6]]))
  + polyline('PROFILE', box(2.5, 3, 57.5, 57.5, 1)) + dimension(0, 0, 85, 0, 85, -10, 0, 85) + dimension(0, 0, 0, 60, -10, 60, 90, 60))

// Machine-frame bar 45 × 45 of loose lines and arcs: four open grooves and a round core.
const groove = [[-22.5, -22.5, 2], [-5, -22.5, 0.5], [-5, -18, 0.4], [-10, -18, 0.4], [-10, -14.5, 1], [-5.5, -10, 1], [5.5, -10, 1], [10, -14.5, 1], [10, -18, 0.4], [5, -18, 0.4], [5, -22.5, 0.5]]
const frame = [0, 1, 2, 3].flatMap((k) => groove.map(([x, y, r]) => [[x, y, r], [-y, x, r], [-x, -y, r], [y, -x, r]][k]))
drawing('frame-bar-45', loose('PROFILE', rounded(frame)) + circle('PROFILE', 0, 0, 5) + line('CENTRE', -28, 0, 28, 0) + line('CENTRE', 0, -28, 0, 28) + dimension(-22.5, -22.5, 22.5, -22.5, 22.5, -32, 0, 45))

// Welded press-frame beam: five plates that overlap where they are welded; a person states that each adds.
drawing('press-beam', [box(0, 0, 200, 20), box(0, 280, 200, 300), box(30, 18, 42, 282), box(158, 18, 170, 282), box(40, 140, 160, 152)].map((plate) => polyline('PLATES', plate)).join('')
  + dimension(0, 0, 200, 0, 200, -30, 0, 200) + dimension(200, 0, 200, 300, 240, 300, 90, 300), { layers: ['PLATES', 'DIM'] })

// Bracket angle with toe and root radii, turned as it sits on the slab.
const angle = rounded([[0, 0], [90, 0], [90, 8, 4], [8, 8, 9], [8, 60, 4], [0, 60]])
const turned = angle.map(([x, y, b]) => [x * Math.cos(0.3) - y * Math.sin(0.3), x * Math.sin(0.3) + y * Math.cos(0.3), b])
drawing('slab-angle', polyline('PROFILE', turned))

// Footbridge handrail: an elliptical tube with a flat groove for the light strip, arcs and lines between.
drawing('handrail', ellipse('PROFILE', 0, 0, 30, 0, 0.7) + ellipse('PROFILE', 0, 0, 26.5, 0, 0.66) + dimension(-30, 0, 30, 0, 30, -30, 0, 60))

// Cover cap: an outer spline closed by lines, as styling tools draw it.
drawing('cover-cap', spline('PROFILE', 3, [0, 0, 0, 0, 1, 2, 2, 2, 2], [[0, 0], [2, 14], [25, 22], [48, 14], [50, 0]])
  + line('PROFILE', 50, 0, 48, 0) + spline('PROFILE', 3, [0, 0, 0, 0, 1, 2, 2, 2, 2], [[48, 0], [46, 12.2], [25, 19.6], [4, 12.2], [2, 0]]) + line('PROFILE', 2, 0, 0, 0))

// Heat sink in the oldest form: POLYLINE and VERTEX, no unit in the file.
const fins = Array.from({ length: 8 }, (_, i) => [[i * 10, 6], [i * 10, 30], [i * 10 + 2, 30], [i * 10 + 2, 6]]).flat()
const sink = [[0, 0], [72, 0], ...[...fins].reverse().slice(0, -1)]
const old = (vertices) => pairs([0, 'POLYLINE'], [8, 'PROFILE'], [66, '1'], [70, '1'], [10, 0], [20, 0]) + vertices.map(([x, y]) => pairs([0, 'VERTEX'], [8, 'PROFILE'], [10, x], [20, y])).join('') + pairs([0, 'SEQEND'], [8, 'PROFILE'])
writeFileSync(join(folder, 'heat-sink.dxf'), pairs([0, 'SECTION'], [2, 'ENTITIES']) + old(sink) + pairs([0, 'ENDSEC'], [0, 'EOF']))

// Sash with solid jambs whose screw holes are blocks: placed, mirrored, and stretched to slots with elliptical ends.
const hole = block('SCREW HOLE', circle('0', 0, 0, 2.1))
drawing('sash-52', polyline('PROFILE', rounded([[0, 0, 0.5], [52, 0, 0.5], [52, 40, 0.5], [70, 40, 0.5], [70, 42, 0.5], [52, 42, 1], [0, 42, 0.5]]))
  + polyline('PROFILE', box(9, 1.8, 43, 40.2, 1)) + insert('PROFILE', 'SCREW HOLE', 4.5, 10) + insert('PROFILE', 'SCREW HOLE', 47.5, 10, 0, -1, 1)
  + insert('PROFILE', 'SCREW HOLE', 4.5, 31, 90, 1.8, 1) + insert('PROFILE', 'SCREW HOLE', 47.5, 31, 90, 1.8, 1), { blocks: hole })

// Hinge leaf drawn in inches, as the client's American office draws.
drawing('hinge-leaf', loose('PROFILE', rounded([[0, 0], [1.75, 0], [1.75, 0.125, 0.03], [0.5, 0.125, 0.0625], [0.5, 0.4, 0.05], [0, 0.4, 0.05]])) + circle('PROFILE', 0.25, 0.2, 0.0937)
  + dimension(0, 0, 1.75, 0, 1.75, -0.3, 0, 1.75), { units: 1 })

// Guide rail whose arcs another program exploded to chords of one circle.
const chords = Array.from({ length: 24 }, (_, i) => Math.PI - (Math.PI * i) / 24).map((t) => [30 + 18 * Math.cos(t), 22 + 18 * Math.sin(t)])
drawing('guide-rail', polyline('PROFILE', [[0, 0], [60, 0], [60, 22], [48, 22], ...chords.slice(1).reverse(), [12, 22], [0, 22]]))

// Thermally broken window bar: two shells, two strips that touch them, a loose steel insert.
drawing('thermal-bar', polyline('ALU', box(0, 0, 60, 40, 1)) + polyline('ALU', box(2, 2, 58, 38, 1)) + polyline('ALU', box(0, 64, 60, 104, 1)) + polyline('ALU', box(2, 66, 58, 102, 1))
  + polyline('STRIP', box(12, 40, 14, 64)) + polyline('STRIP', box(46, 40, 48, 64)) + polyline('STEEL', box(10, 8, 40, 32, 3)) + polyline('STEEL', box(12, 10, 38, 30, 1)), { layers: ['ALU', 'STRIP', 'STEEL'] })

// A sheet with a frame, title block and three details that lie apart.
drawing('facade-sheet', polyline('SHEET', box(-60, -60, 420, 240)) + polyline('SHEET', box(300, -60, 420, -30)) + text('SHEET', 306, -48, 6, 'DETAILS 1-3') + mullion('PROFILE', 0, 20)
  + polyline('PROFILE', rounded([[120, 0, 0.5], [180, 0, 0.5], [180, 3, 0.5], [123, 3, 1], [123, 60, 0.5], [120, 60, 0.5]])) + circle('PROFILE', 280, 60, 25) + circle('PROFILE', 280, 60, 22)
  + dimension(120, 0, 180, 0, 180, -15, 0, 60), { layers: ['PROFILE', 'SHEET', 'DIM'] })
