const pair = (code: number, value: string | number) => `${code}\n${value}`

function polyline(layer: string, points: readonly (readonly [number, number])[]): string[] {
  const head = [pair(0, 'LWPOLYLINE'), pair(8, layer), pair(90, points.length), pair(70, 1)]
  return [...head, ...points.flatMap(([x, y]) => [pair(10, x), pair(20, y)])]
}
const box = (layer: string, x: number, y: number, width: number, height: number) =>
  polyline(layer, [
    [x, y],
    [x + width, y],
    [x + width, y + height],
    [x, y + height],
  ])
const tube = (layer: string, x: number, y: number, width: number, height: number, wall: number) => [
  ...box(layer, x, y, width, height),
  ...box(layer, x + wall, y + wall, width - 2 * wall, height - 2 * wall),
]
const block = (name: string, entities: string[]) => [
  pair(0, 'BLOCK'),
  pair(8, '0'),
  pair(2, name),
  pair(70, 0),
  pair(10, 0),
  pair(20, 0),
  ...entities,
  pair(0, 'ENDBLK'),
]
const insert = (name: string, x: number, y: number) => [pair(0, 'INSERT'), pair(8, '0'), pair(2, name), pair(10, x), pair(20, y)]

/** A horizontal dimension of 60 mm under the box whose corner is (x, y). */
const dimension = (x: number, y: number) => [
  pair(0, 'DIMENSION'),
  pair(8, '0'),
  pair(70, 32),
  pair(10, x + 60),
  pair(20, y - 10),
  pair(42, 60),
  pair(13, x),
  pair(23, y),
  pair(14, x + 60),
  pair(24, y),
]

export const HOSTILE_LAYERS = ['<img src=x onerror=alert(1)>', '"><script>alert(2)</script>', '=HYPERLINK("http://x")']

const at = (i: number): [number, number] => [(i % 5) * 200, Math.floor(i / 5) * 200]

/**
 * A façade sheet in mm: 15 tubes 60 × 40 … 54 × 2 drawn directly on layers with hostile names, block TUBE (50 × 30 × 3)
 * placed 5 times, block BOLT (Ø 3) 195 times, block MARK (a text) 400 times, 300 dimensions of 60 mm.
 */
export function facadeSheet(): string {
  const entities: string[] = []
  for (let i = 0; i < 15; i++) entities.push(...tube(HOSTILE_LAYERS[i % 3], ...at(i), 60, 40 + i, 2))
  for (let i = 15; i < 20; i++) entities.push(...insert('TUBE', ...at(i)))
  for (let i = 0; i < 195; i++) entities.push(...insert('BOLT', 1100 + (i % 20) * 30, Math.floor(i / 20) * 30))
  for (let i = 0; i < 400; i++) entities.push(...insert('MARK', (i % 20) * 45, Math.floor(i / 20) * 40))
  for (let i = 0; i < 300; i++) entities.push(...dimension(...at(i % 20)))
  const blocks = [
    ...block('TUBE', tube('0', 0, 0, 50, 30, 3)),
    ...block('BOLT', [pair(0, 'CIRCLE'), pair(8, '0'), pair(10, 0), pair(20, 0), pair(40, 1.5)]),
    ...block('MARK', [pair(0, 'TEXT'), pair(8, '0'), pair(10, 0), pair(20, 0), pair(40, 2), pair(1, 'X')]),
  ]
  const section = (name: string, body: string[]) => [pair(0, 'SECTION'), pair(2, name), ...body, pair(0, 'ENDSEC')]
  const header = section('HEADER', [pair(9, '$ACADVER'), pair(1, 'AC1015'), pair(9, '$INSUNITS'), pair(70, 4)])
  return [...header, ...section('BLOCKS', blocks), ...section('ENTITIES', entities), pair(0, 'EOF')].join('\n')
}
