import type { Quantity, Unit, UnitPart, UnitSystem } from './quantity'

const INCH = 25.4
const FOOT = 304.8
const POUND = 0.45359237
/** standard gravity, m/s² (exact by definition): pound-force = pound × this, N */
const POUND_FORCE = POUND * 9.80665

function unit(size: number, ascii: string, ...parts: UnitPart[]): Unit {
  return { parts, ascii, size }
}

const power = (base: string, exponent: number, size: number): Unit =>
  unit(size ** exponent, exponent === 1 ? base : `${base}${exponent}`, { base, power: exponent })

const ratioOf = (over: string, under: string, size: number, exponent = 1): Unit =>
  unit(
    size,
    exponent === 1 ? `${over}/${under}` : `${over}/${under}${exponent}`,
    { base: over, power: 1 },
    { base: under, power: exponent, under: true },
  )

const product = (a: string, b: string, size: number): Unit =>
  unit(size, `${a}*${b}`, { base: a, power: 1 }, { base: b, power: 1 })

const DEGREE = unit(1, 'deg', { base: '°', power: 1 })
const NONE = unit(1, '')

const METRIC = {
  length: power('mm', 1, 1),
  angle: DEGREE,
  massPerLength: ratioOf('kg', 'm', 1),
  perimeterFactor: unit(1, 'mm/(kg/m)', { base: 'mm·m', power: 1 }, { base: 'kg', power: 1, under: true }),
  ratio: NONE,
  count: NONE,
  memberLength: power('m', 1, 1000),
  force: power('kN', 1, 1000),
  lineLoad: ratioOf('kN', 'm', 1),
  moment: product('kN', 'm', 1e6),
  stress: power('MPa', 1, 1),
  density: ratioOf('kg', 'm', 1, 3),
  mass: power('kg', 1, 1),
}

/** The unit of every quantity in each system. Conversions are exact by definition: 1 in = 25.4 mm, 1 lb = 0.45359237 kg. */
export const UNITS: Record<UnitSystem, Record<Quantity, Unit>> = {
  mm: {
    ...METRIC,
    area: power('mm', 2, 1),
    modulus: power('mm', 3, 1),
    secondMoment: power('mm', 4, 1),
    warping: power('mm', 6, 1),
  },
  cm: {
    ...METRIC,
    area: power('cm', 2, 10),
    modulus: power('cm', 3, 10),
    secondMoment: power('cm', 4, 10),
    warping: power('cm', 6, 10),
  },
  in: {
    length: power('in', 1, INCH),
    area: power('in', 2, INCH),
    modulus: power('in', 3, INCH),
    secondMoment: power('in', 4, INCH),
    warping: power('in', 6, INCH),
    angle: DEGREE,
    massPerLength: ratioOf('lb', 'ft', POUND / (FOOT / 1000)),
    perimeterFactor: unit(
      INCH / (POUND / (FOOT / 1000)),
      'in/(lb/ft)',
      { base: 'in·ft', power: 1 },
      { base: 'lb', power: 1, under: true },
    ),
    ratio: NONE,
    count: NONE,
    memberLength: power('ft', 1, FOOT),
    force: power('lbf', 1, POUND_FORCE),
    lineLoad: ratioOf('lbf', 'ft', POUND_FORCE / FOOT),
    moment: product('lbf', 'ft', POUND_FORCE * FOOT),
    stress: power('psi', 1, POUND_FORCE / INCH ** 2),
    density: ratioOf('lb', 'ft', POUND / (FOOT / 1000) ** 3, 3),
    mass: power('lb', 1, POUND),
  },
}

export const unitOf = (quantity: Quantity, system: UnitSystem): Unit => UNITS[system][quantity]

/** A stored value in the system's unit. */
export const toUnit = (value: number, quantity: Quantity, system: UnitSystem): number => value / unitOf(quantity, system).size

/** A value in the system's unit as it is stored. */
export const fromUnit = (value: number, quantity: Quantity, system: UnitSystem): number => value * unitOf(quantity, system).size
