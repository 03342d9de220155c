import { describe, expect, it } from 'vitest'
import { DEFAULT_LIMITS } from '@/lib/dxf/drawing'
import { ARC, ELLIPSE } from '@/lib/geometry/edges'
import {
  block,
  blocks,
  circle,
  codesOf,
  drawn,
  edgesOf,
  endsOf,
  entity,
  finding,
  insert,
  line,
  read,
  select,
  table,
} from '../support/dxf'

const UNIT = line(0, 0, 1, 0)
const placed = (content: string, ...rest: [number, number | string][]) =>
  read(drawn(insert('B', ...rest), { before: blocks(block('B', content)) }))
const rounded = (rows: number[][]) => rows.map((row) => row.map((v) => Math.round(v * 1e9) / 1e9 + 0))

describe('INSERT', () => {
  it('moves, turns and scales about the base point', () => {
    const drawing = read(
      drawn(entity('INSERT', [2, 'B'], [10, 100], [20, 50], [41, 2], [42, 2], [50, 90]), {
        before: blocks(block('B', line(1, 1, 4, 1), [1, 1])),
      }),
    )
    expect(endsOf(drawing)).toEqual([[100, 50, 100, 56]])
    expect(drawing.read).toEqual({ LINE: 1, INSERT: 1 })
    expect([drawing.blocks, drawing.entities.block[1], drawing.entities.insert[1]]).toEqual([['B'], 1, 1])
  })

  it('finds its block whatever the case of the name', () => {
    expect(endsOf(read(drawn(insert('plate'), { before: blocks(block('Plate', UNIT)) })))).toHaveLength(1)
  })

  it('keeps circular arcs under equal scale and mirroring, and makes them elliptical under unequal scale', () => {
    const arc = entity('ARC', [10, 0], [20, 0], [40, 2], [50, 0], [51, 90])
    const [same] = edgesOf(placed(arc, [41, -3], [42, 3], [50, 30]))
    expect(same).toMatchObject({ kind: ARC, radius: 6 })
    expect(same.kind === ARC && same.sweep).toBeWithin(-Math.PI / 2, { absolute: 1e-15 })
    const [uneven] = edgesOf(placed(arc, [41, 3], [42, 1]))
    expect(uneven).toMatchObject({ kind: ELLIPSE, u: { x: 6, y: 0 }, v: { x: 0, y: 2 }, a: { x: 6, y: 0 }, start: 0 })
  })

  it('an ellipse from unequal scale becomes a circle again where an outer insert undoes it', () => {
    const drawing = read(
      drawn(insert('A', [42, 4]), { before: blocks(block('A', insert('B', [41, 4])), block('B', circle(0, 0, 1))) }),
    )
    expect(edgesOf(drawing)).toMatchObject([{ kind: ARC, radius: 4 }])
  })

  it('an array turns with the rotation and its spacing is not scaled', () => {
    const drawing = placed(UNIT, [41, 2], [42, 2], [50, 90], [70, 2], [71, 3], [44, 10], [45, 20])
    expect(rounded(endsOf(drawing))).toEqual([
      [0, 0, 0, 2],
      [0, 10, 0, 12],
      [-20, 0, -20, 2],
      [-20, 10, -20, 12],
      [-40, 0, -40, 2],
      [-40, 10, -40, 12],
    ])
    expect(new Set(drawing.entities.insert.slice(1, 7)).size).toBe(6)
  })

  it('nests: turn, scale and place multiply', () => {
    const before = blocks(
      block('OUTER', entity('INSERT', [2, 'INNER'], [10, 10], [20, 0], [50, 90])),
      block('INNER', line(1, 0, 2, 0)),
    )
    expect(rounded(endsOf(read(drawn(insert('OUTER', [41, 2], [42, 2]), { before }))))).toEqual([[20, 2, 20, 4]])
  })

  it('seen from behind is mirrored in x after all else', () => {
    const drawing = read(
      drawn(entity('INSERT', [2, 'B'], [10, -10], [20, 5], [50, 90], [210, 0], [220, 0], [230, -1]), {
        before: blocks(block('B', line(0, 0, 3, 1))),
      }),
    )
    expect(rounded(endsOf(drawing))).toEqual([[10, 5, 11, 8]])
  })

  it('a block that is not in the file, one at scale 0, and one in another file are errors that name it', () => {
    const message = (text: string, code: string, before = '') => finding(read(drawn(text, { before })), code).message
    expect(message(insert('NOWHERE', [5, 'A1']), 'block-missing')).toMatch(/INSERT, handle A1, line \d+ .* places block NOWHERE/)
    expect(message(insert('B', [41, 0]), 'insert-scale-zero', blocks(block('B', UNIT)))).toContain('block B at scale 0')
    const external = blocks(entity('BLOCK', [2, 'X'], [70, 4], [10, 0], [20, 0], [1, 'other.dwg']) + entity('ENDBLK'))
    expect(message(insert('X'), 'block-external', external)).toContain('external drawing X')
  })

  it('a block defined twice alike is one, differently an error', () => {
    const twice = (other: string) => read(drawn(insert('B'), { before: blocks(block('B', UNIT)) + blocks(block('b', other)) }))
    expect(codesOf(twice(line(0, 0, 2, 0)))).toContain('block-twice')
    const same = read(drawn(insert('B'), { before: blocks(block('B', UNIT)) + blocks(block('B', UNIT)) }))
    expect(same.edges.count).toBe(1)
  })

  it('a fault in a block counts where the block is placed, and names the block', () => {
    const bad = line('x', 0, 1, 0)
    expect(codesOf(read(drawn(line(0, 0, 1, 1), { before: blocks(block('B', bad)) })))).toEqual([])
    expect(finding(placed(bad), 'number-bad').message).toContain('in block B')
  })

  it('as placed beyond 1e12 units is an error', () => {
    expect(codesOf(placed(line(0, 0, 1e11, 0), [41, 1e11], [42, 1e11]))).toContain('placed-too-far')
  })
})

describe('bombs', () => {
  const nest = (levels: number, each: number) =>
    blocks(
      ...Array.from({ length: levels }, (_, i) => block(`B${i}`, i === levels - 1 ? UNIT : insert(`B${i + 1}`).repeat(each))),
    )

  it('a block that places itself, and two that place each other, are errors that show the way round', () => {
    const self = read(drawn(insert('A'), { before: blocks(block('A', insert('A') + UNIT)) }))
    expect(finding(self, 'block-holds-itself').message).toContain('places itself (A → A)')
    const each = read(drawn(insert('A'), { before: blocks(block('A', insert('B')), block('B', insert('A'))) }))
    expect(finding(each, 'block-holds-itself').message).toContain('(A → B → A)')
  })

  it('32 levels are opened, 33 are not, and 20,000 end as soon', () => {
    expect(read(drawn(insert('B0'), { before: nest(32, 1) })).edges.count).toBe(1)
    for (const levels of [33, 20_000]) {
      const drawing = read(drawn(insert('B0'), { before: nest(levels, 1) }))
      expect(finding(drawing, 'nested-too-deep').message).toContain('more than 32 deep (setting nesting)')
      expect(drawing.edges.count).toBe(0)
    }
  })

  it('10^9 entities in nested blocks and 10^10 in an array cost nothing', () => {
    const start = performance.now()
    const nested = read(drawn(insert('B0'), { before: nest(10, 10) }))
    expect(finding(nested, 'too-many-after-opening').message).toContain('this server takes 2,000,000 (setting entities)')
    const array = placed(UNIT, [70, 100000], [71, 100000])
    expect(finding(array, 'too-many-after-opening').severity).toBe('error')
    expect(array.edges.count).toBe(0)
    expect(performance.now() - start).toBeLessThan(1000)
  })

  it('an empty block in a huge array is refused all the same', () => {
    expect(codesOf(placed('', [70, 32767], [71, 32767]))).toContain('too-many-after-opening')
  })

  it('the limit is the setting', () => {
    const text = drawn(insert('B', [70, 10]), { before: blocks(block('B', UNIT)) })
    expect(read(text, { ...DEFAULT_LIMITS, entities: 22 }).edges.count).toBe(10)
    expect(codesOf(read(text, { ...DEFAULT_LIMITS, entities: 20 }))).toContain('too-many-after-opening')
  })
})

describe('layers and line types in blocks', () => {
  const before =
    table(
      'LAYER',
      [
        [2, 'METAL'],
        [6, 'CENTER'],
      ],
      [
        [2, 'COLD'],
        [70, 1],
      ],
      [
        [2, 'DARK'],
        [62, -7],
      ],
    ) + blocks(block('B', UNIT + UNIT.replace('8\n0', '8\nOWN') + UNIT.replace('8\n0', '8\n0\n6\nByBlock')))
  const at = (layer: string, ...rest: [number, string][]) =>
    read(drawn(entity('INSERT', [2, 'B'], [10, 0], [20, 0], ...rest).replace('8\n0', `8\n${layer}`), { before }))

  it('layer 0 takes the layer of the insert, with its line type; another layer stays', () => {
    const { entities, layers, lineTypes } = at('METAL', [6, 'HIDDEN'])
    expect([1, 2, 3].map((row) => layers[entities.layer[row]].name)).toEqual(['METAL', 'OWN', 'METAL'])
    expect([1, 2, 3].map((row) => lineTypes[entities.lineType[row]])).toEqual(['CENTER', 'CONTINUOUS', 'HIDDEN'])
  })

  it('a frozen insert hides all it places; one on a layer that is off hides what is on layer 0', () => {
    expect(select(at('COLD')).edges).toHaveLength(0)
    expect(select(at('DARK')).edges).toHaveLength(1)
  })
})
