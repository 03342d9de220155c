import { expect, test } from 'vitest'
import { codes, combined } from './setOf'
import { circle, polygon, rectangle } from './shapes'

const found = (answer: ReturnType<typeof combined>, code: string) => {
  const finding = answer.findings.find((f) => f.code === code)
  if (!finding) throw new Error(`no ${code} among ${codes(answer).join(', ')}`)
  return finding
}

test('a tube closed only by a seam 3 µm thick over 20 mm says so, with the middle of the seam', () => {
  const chamber = polygon([5, 5], [95, 5], [95, 45], [60, 45], [60, 49.997], [40, 49.997], [40, 45], [5, 45])
  const { params, at } = found(combined([rectangle(0, 0, 100, 50), chamber]), 'wall-thin')
  expect(params.width).toBeWithin(0.003, { relative: 1e-9 })
  expect(params.length).toBeWithin(20, { relative: 1e-6 })
  expect(at?.[0]).toBeWithin(50, { absolute: 1e-5 })
  expect(at?.[1]).toBeWithin(49.9985, { absolute: 1e-9 })
})

test('a bore 2 µm from the side of a plate is found wherever along the side it lies', () => {
  for (const x of [13, 27, 30, 41.7]) {
    const { params, at } = found(combined([rectangle(0, 0, 60, 40), circle(x, 10.002, 10)]), 'wall-thin')
    expect(params.width).toBeWithin(0.002, { relative: 1e-6 })
    // the metal is thinner than 0.05 mm over 2 √(2 · 10 · 0.048)
    expect(params.length).toBeWithin(2 * Math.sqrt(2 * 10 * 0.048), { relative: 0.01 })
    expect(at?.[0]).toBeWithin(x, { absolute: 1e-3 })
  }
})

test('two round bars 0.01 mm apart are asked about; 0.06 mm apart, and a bore 0.06 mm from the side, are not', () => {
  expect(found(combined([circle(0, 0, 10), circle(20.01, 0, 10)]), 'gap').params.gap).toBeWithin(0.01, { relative: 1e-6 })
  expect(codes(combined([circle(0, 0, 10), circle(20.06, 0, 10)]))).toEqual([])
  expect(codes(combined([rectangle(0, 0, 60, 40), circle(27, 10.06, 10)]))).toEqual([])
})

test('tubes of 0.06 mm wall, sharp tips and fillets are no thin walls', () => {
  expect(codes(combined([circle(0, 0, 10), circle(0, 0, 9.94)]))).toEqual([])
  expect(codes(combined([polygon([0, 0], [100, 0], [0, 1])]))).toEqual([])
  expect(codes(combined([polygon([0, 0], [100, 0.01], [100, 20], [0, 20])]))).toEqual([])
})
