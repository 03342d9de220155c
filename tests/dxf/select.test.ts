import { describe, expect, it } from 'vitest'
import { drawsNoMetal } from '@/lib/dxf/lineTypes'
import {
  circle,
  drawn,
  entity,
  finding,
  fixture,
  groups,
  line,
  read,
  section,
  select,
  table,
  blocks,
  block,
  EOF,
} from '../support/dxf'

const on = (layer: string, text = line(0, 0, 1, 1)) => text.replace('8\n0\n', `8\n${layer}\n`)
const LAYERS = table(
  'LAYER',
  [
    [2, 'METAL'],
    [70, 0],
    [62, 7],
  ],
  [
    [2, 'OFF'],
    [62, -7],
  ],
  [
    [2, 'FROZEN'],
    [70, 1],
  ],
  [
    [2, 'LOCKED'],
    [70, 4],
  ],
  [
    [2, 'NEWFROZEN'],
    [70, 2],
  ],
  [
    [2, 'NOPLOT'],
    [290, 0],
  ],
)
const drawing = (...entities: string[]) => read(drawn(entities.join(''), { before: LAYERS }))
const codes = (list: { code: string }[]) => list.map(({ code }) => code)

describe('what is taken by default', () => {
  it('layers that are on, thawed and plot; locked ones and those frozen in new viewports too', () => {
    const all = drawing(...['METAL', 'OFF', 'FROZEN', 'LOCKED', 'NEWFROZEN', 'NOPLOT', 'Defpoints'].map((name) => on(name)))
    const selection = select(all)
    expect([...selection.edges]).toEqual([0, 3, 4])
    expect(selection.layers.filter(({ taken }) => taken > 0).map(({ name }) => name)).toEqual(['METAL', 'LOCKED', 'NEWFROZEN'])
    const { message } = selection.findings[0]
    expect(message).toContain('1 on OFF (off), 1 on FROZEN (frozen), 1 on NOPLOT (not plotting), 1 on Defpoints (not plotting)')
  })

  it('line types other than centre, hidden and phantom, counted', () => {
    const all = drawing(
      line(0, 0, 1, 1),
      line(0, 0, 1, 1, [6, 'CENTERX2']),
      line(0, 0, 1, 1, [6, 'dashed']),
      line(0, 0, 1, 1, [6, 'FENCELINE1']),
    )
    const selection = select(all)
    expect([...selection.edges]).toEqual([0, 3])
    expect(selection.findings[0].message).toContain('1 on CENTERX2, 1 on dashed')
  })

  it.each([
    'CENTER',
    'CENTER2',
    'CENTERX2',
    'HIDDEN',
    'HIDDENX2',
    'PHANTOM2',
    'DASHED',
    'DASHDOT2',
    'ACAD_ISO02W100',
    'ACAD_ISO04W100',
    'ACAD_ISO12W100',
    'plan|CENTER',
    'plan$0$HIDDEN2',
    'Mitte',
    'VERDECKT2',
    'ISO_MITTELLINIE',
    'AM_ISO08W050',
  ])('%s draws no metal', (name) => {
    expect(drawsNoMetal(name)).toBe(true)
  })
  it.each(['CONTINUOUS', 'Continuous', 'BORDER', 'DOT', 'ACAD_ISO07W100', 'CENTERLESS', 'STRAIGHT', ''])(
    '%s may draw metal',
    (name) => {
      expect(drawsNoMetal(name)).toBe(false)
    },
  )

  it('visible entities of the model, without hatch boundaries', () => {
    const hatch = entity(
      'HATCH',
      [91, 1],
      [92, 2],
      [72, 0],
      [73, 1],
      [93, 3],
      [10, 0],
      [20, 0],
      [10, 9],
      [20, 0],
      [10, 0],
      [20, 9],
      [97, 0],
    )
    const all = drawing(line(0, 0, 1, 1), line(0, 0, 1, 1, [60, 1]), line(0, 0, 1, 1, [67, 1]), hatch)
    const selection = select(all)
    expect([...selection.edges]).toEqual([0])
    expect(codes(selection.findings)).toEqual(['layouts-left-out', 'invisible-left-out', 'hatches-left-out'])
    expect([...select(all, { hatches: true }).edges]).toEqual([0, 3, 4, 5])
    expect([...select(all, { space: 'layout' }).edges]).toEqual([2])
    expect(selection.kinds.find(({ name }) => name === 'LINE')).toEqual({ name: 'LINE', taken: 1, left: 2 })
  })
})

describe('what a recipe names', () => {
  it('is taken whatever its state, and whatever its case', () => {
    const all = drawing(on('METAL'), on('OFF'), on('FROZEN', line(0, 0, 1, 1, [6, 'CENTER'])))
    expect([...select(all, { layers: ['off', 'frozen'] }).edges]).toEqual([1])
    expect([...select(all, { layers: ['off', 'frozen'], lineTypes: ['center'] }).edges]).toEqual([2])
  })

  it('and is not in the drawing is said', () => {
    const found = select(drawing(on('METAL')), { layers: ['METAL', 'GONE'], lineTypes: ['CONTINUOUS', 'DOT'] }).findings
    expect(codes(found)).toEqual(['layer-not-found', 'line-type-not-found'])
    const elsewhere = select(drawing(on('METAL')), { space: 'A3' }).findings
    expect(elsewhere[0]).toMatchObject({ code: 'space-not-found', severity: 'error' })
  })
})

describe('nothing taken', () => {
  it('0 in the model, n on layouts: take these?', () => {
    const found = finding(
      drawing(line(0, 0, 1, 1, [67, 1], [410, 'Sheet A']), circle(0, 0, 1, [67, 1], [410, 'Sheet A'])),
      'only-on-layouts',
    )
    expect(found.severity).toBe('error')
    expect(found.message).toContain("0 outlines' entities in the model, 2 on layouts (2 on Sheet A): take these?")
  })

  it('the outline on a layer that is off: take these?', () => {
    expect(finding(drawing(on('OFF'), on('OFF')), 'only-on-hidden').message).toContain(
      '2 on layers left out (2 on OFF (off)): take these?',
    )
  })

  it('the outline dashed: take these?', () => {
    expect(finding(drawing(line(0, 0, 1, 1, [6, 'DASHED'])), 'only-on-line-types').message).toContain('1 on DASHED')
  })

  it('no outline at all says what there is', () => {
    expect(finding(drawing(entity('TEXT')), 'nothing-drawn').message).toContain('holds no outline')
    expect(finding(drawing(entity('TEXT')), 'nothing-drawn').message).toContain('It has 1 TEXT.')
    expect(finding(drawing(), 'nothing-drawn').message).toContain('It is empty.')
  })
})

describe('faults', () => {
  it('on a layer that is not taken block nothing, and are told', () => {
    const all = drawing(on('METAL'), on('OFF', line(0, 0, '1,5', 1)))
    const { findings } = select(all)
    expect(findings.map(({ severity }) => severity)).toEqual(['note'])
    expect(findings[0].message).toContain('1 entity that could not be read is on what is left out')
    expect(findings[0].message).toContain('"1,5"')
    expect(select(all, { layers: ['OFF'] }).findings.some(({ severity }) => severity === 'error')).toBe(true)
  })
})

describe('layouts', () => {
  it('have the names of their tabs, by way of LAYOUT and BLOCK_RECORD', () => {
    const before =
      table(
        'BLOCK_RECORD',
        [
          [5, '1A'],
          [2, '*Paper_Space'],
        ],
        [
          [5, '1B'],
          [2, '*Paper_Space0'],
        ],
      ) + blocks(block('*Paper_Space0', circle(0, 0, 3)))
    const layout = (name: string, handle: string) =>
      groups([0, 'LAYOUT'], [100, 'AcDbPlotSettings'], [1, 'printer'], [100, 'AcDbLayout'], [1, name], [330, handle])
    const text =
      before +
      section('ENTITIES', line(0, 0, 1, 1) + line(0, 0, 2, 2, [67, 1])) +
      section('OBJECTS', layout('Plan', '1A') + layout('Detail', '1B')) +
      EOF
    const all = read(text)
    expect(all.spaces).toEqual(['model', 'Plan', 'Detail'])
    expect([...select(all, { space: 'Plan' }).edges]).toEqual([1])
    expect([...select(all, { space: 'Detail' }).edges]).toEqual([2])
  })

  it('p21 keeps 2 entities on Layout1, 1 on OLD (off) and 1 on FIXTURE (frozen) out', () => {
    const all = read(fixture('cases', 'p21.dxf'))
    const selection = select(all)
    expect(selection.spaces).toEqual([
      { name: 'model', taken: 2, left: 5 },
      { name: 'Layout1', taken: 0, left: 2 },
    ])
    expect(selection.layers.filter(({ taken }) => taken > 0)).toEqual([{ name: 'PROFILE', taken: 2, left: 0 }])
    expect(selection.layers.filter(({ name }) => ['OLD', 'FIXTURE'].includes(name)).map(({ left }) => left)).toEqual([1, 1])
  })
})
