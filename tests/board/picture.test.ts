import { readFileSync } from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { type PictureOptions, pictureSvg } from '@/components/picture/pictureSvg'
import { scaleBarLength } from '@/components/picture/scaleBar'
import { typefaceOf } from '@/components/picture/typeface'
import { xmlText } from '@/components/picture/xml'
import { answerWith } from './answer'
import { plateWithHole, zShape } from './shapes'
import { wellFormed } from './wellFormed'

function bytesOf(...parts: string[]): ArrayBuffer {
  const bytes = readFileSync(path.join(import.meta.dirname, '../..', ...parts))
  return new Uint8Array(bytes).buffer
}
const files = (face: string) => bytesOf('node_modules/@fontsource', face, 'files', `${face}-latin-400-normal.woff`)
const signs = bytesOf('app/fonts/signs.woff')
const faces = {
  text: typefaceOf([files('atkinson-hyperlegible-next'), signs]),
  mono: typefaceOf([files('atkinson-hyperlegible-mono'), signs]),
}
const options: PictureOptions = {
  number: 'P-0001',
  title: 'Plate',
  letter: 'A',
  state: 'draft',
  faces,
  writing: {
    names: { x: 'x', y: 'y', axis1: '1', axis2: '2' },
    length: (mm) => `${mm} mm`,
    angle: (degrees) => `${degrees.toFixed(2)}°`,
  },
}
const picture = (change: Partial<PictureOptions> = {}) =>
  pictureSvg(answerWith(plateWithHole()), plateWithHole(), { ...options, ...change })

test('the picture is well-formed XML and the same bytes each time', () => {
  expect(wellFormed(picture())).toBe(true)
  expect(picture()).toBe(picture())
})

test('the plate of 60 × 40 mm is drawn about its middle and placed in the middle of the free room', () => {
  const svg = picture()
  const [, x, y, scale] = svg.match(/transform="translate\(([\d.]+) ([\d.]+)\) scale\(([\d.]+)\)"/) ?? []
  expect(Number(scale)).toBeWithin(604 / 40, { relative: 1e-12 })
  expect(Number(x)).toBeWithin(600, { absolute: 1e-9 })
  expect(Number(y)).toBeWithin(100 + 604 / 2, { absolute: 1e-9 })
  expect(svg).toContain('M-30 20L30 20L30 -20L-30 -20')
})

test('nothing in it can style, run or load: no style, script, link, event or foreign content', () => {
  expect(picture()).not.toMatch(/style|<script|<image|<use|<foreignObject|<text|href|\son\w+=|url\((?!#metal\))/)
})

test('names that try to be markup stay names', () => {
  const hostile = '"><script>alert(1)</script>&\u0000\ud800]]>'
  const answer = answerWith(zShape())
  const source = { ...answer.source, name: hostile }
  const svg = pictureSvg({ ...answer, source }, zShape(), { ...options, title: hostile, number: hostile })
  expect(svg).not.toContain('<script')
  expect(wellFormed(svg)).toBe(true)
})

test('a title of 5000 characters is cut to its place', () => {
  const long = picture({ title: 'M'.repeat(5000) }).length
  expect(long).toBeLessThan(picture({ title: 'M'.repeat(60) }).length + 12_000)
})

test('text is drawn as outlines without a number that XML readers stumble over', () => {
  const data = faces.text.path('Mullion 60 × 118, drained θ ≤ 一', 28.42, 846, 24)
  expect(data).toMatch(/^[MLQCZ\d. -]+$/)
})

test('a character that the text face lacks comes from the second face: θ and ≤ have their own width', () => {
  const box = faces.text.width('\ue000', 100)
  expect(faces.text.width('θ', 100)).not.toBe(box)
  expect(faces.text.width('Iθ', 100)).toBeWithin(faces.text.width('I', 100) + faces.text.width('θ', 100), { relative: 1e-12 })
})

test.each([
  [1, 220, 200],
  [4.2, 220, 50],
  [0.001, 220, 200_000],
  [2, 100, 50],
])('at %d px a mm the scale bar for %d px of room is %d mm long', (scale, room, length) => {
  expect(scaleBarLength(scale, room)).toBeWithin(length, { relative: 1e-12 })
})

test('what XML does not allow becomes U+FFFD', () => {
  expect(xmlText('a\u0001b\ud800c')).toBe('a\ufffdb\ufffdc')
  expect(xmlText(`<&>"'`)).toBe('&lt;&amp;&gt;&quot;&#39;')
})
