/** A condition on a figure, its value in mm, mm², mm⁴ or kg/m. */
export interface Condition {
  figure: Figure
  op: '<' | '<=' | '=' | '>=' | '>'
  value: number
}
export interface Search {
  words: string[]
  conditions: Condition[]
}

const FIGURES = { area: 2, mass: 0, ix: 4, iy: 4, i1: 4, i2: 4, theta: 0, circle: 1 } as const
type Figure = keyof typeof FIGURES

const LENGTHS: Record<string, number> = { mm: 1, cm: 10, m: 1000, in: 25.4, ft: 304.8 }
const KG_PER_M: Record<string, number> = { 'kg/m': 1, 'lb/ft': 0.45359237 / 0.3048 }
const POWERS: Record<string, number> = { '': 1, '2': 2, '²': 2, '4': 4, '⁴': 4 }

const CONDITION = /^([a-z0-9]+)(<=|>=|=|<|>|≤|≥)(-?[0-9]+(?:[.,][0-9]+)?(?:e[+-]?[0-9]+)?)([a-z/]*)([0-9²⁴]?)$/i
const isFigure = (word: string): word is Figure => word in FIGURES
const OPS: Record<string, Condition['op']> = { '<': '<', '<=': '<=', '≤': '<=', '=': '=', '>': '>', '>=': '>=', '≥': '>=' }

/** `Ix ≥ 40 cm⁴` as people write it: the blanks inside a condition are dropped. */
const closedUp = (q: string) =>
  q
    .replace(/\s*(<=|>=|[<>=≤≥])\s*/g, '$1')
    .replace(/([<>=≤≥]-?[\d.,]+)\s+((?:mm|cm|m|in|ft)[24²⁴]?|kg\/m|lb\/ft)(?=\s|$)/gi, '$1$2')

/** `mullion ix>=40cm4 mass<=2.1`: words to look for and conditions to meet. What is no condition is a word. */
export function readSearch(q: string): Search {
  const search: Search = { words: [], conditions: [] }
  for (const part of closedUp(q).split(/\s+/).filter(Boolean)) {
    const condition = readCondition(part)
    if (condition) search.conditions.push(condition)
    else search.words.push(part)
  }
  return search
}

function readCondition(part: string): Condition | null {
  const [, name = '', op = '', number = '', unit = '', power = ''] = CONDITION.exec(part) ?? []
  const figure = name.toLowerCase()
  if (!isFigure(figure) || !(op in OPS)) return null
  const factor = factorOf(figure, unit.toLowerCase(), power)
  return factor === null ? null : { figure, op: OPS[op], value: Number(number.replace(',', '.')) * factor }
}

/** Stored units per written unit; null where the unit does not fit the figure. */
function factorOf(figure: Figure, unit: string, power: string): number | null {
  if (figure === 'mass') return unit === '' && power === '' ? 1 : power === '' ? (KG_PER_M[unit] ?? null) : null
  if (unit === '') return power === '' ? 1 : null
  const dimension = FIGURES[figure]
  return unit in LENGTHS && POWERS[power] === dimension ? LENGTHS[unit] ** dimension : null
}
