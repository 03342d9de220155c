/** Kinds of quantity the product shows. Stored in mm, mm², mm³, mm⁴, mm⁶, degrees, kg, N, MPa, m for lengths of members in mm too. */
export type Quantity =
  | 'length'
  | 'area'
  | 'modulus'
  | 'secondMoment'
  | 'warping'
  | 'angle'
  | 'massPerLength'
  | 'perimeterFactor'
  | 'ratio'
  | 'count'
  | 'memberLength'
  | 'force'
  | 'lineLoad'
  | 'moment'
  | 'stress'
  | 'density'
  | 'mass'

/**
 * How a team shows section figures: `mm` everything in mm; `cm` lengths in mm, areas, moduli and second moments in cm², cm³, cm⁴
 * as European tables print them; `in` inch and pound.
 */
export type UnitSystem = 'mm' | 'cm' | 'in'

/** One factor of a unit; `under` stands below the stroke. The screen raises `power` (the fonts have no ⁴ and ⁶). */
export interface UnitPart {
  base: string
  power: number
  under?: true
}

export interface Unit {
  parts: readonly UnitPart[]
  /** plain ASCII, for copies, CSV and JSON */
  ascii: string
  /** stored units in one of these */
  size: number
}

/** What formatting needs to know of a team's settings. */
export interface UnitSettings {
  lengthUnit: UnitSystem
  /** significant digits shown */
  digits: number
}
