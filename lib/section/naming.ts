import type { Figure, FigureSymbol } from './figures/figure'

export type AxisNaming = 'xy' | 'yz'
export type SymbolNaming = 'en' | 'us'

export interface NamingSettings {
  axes: AxisNaming
  symbols: SymbolNaming
}

export interface AxisNames {
  x: string
  y: string
  axis1: string
  axis2: string
}

/**
 * How a team names the axes. x–y with principal axes 1 and 2; or y–z with z up and y to the right, principal axes u and v, x along
 * the member: there Iy is our Ix, Iz our Iy, Iyz = +Ixy. Names only: figures, API, CSV and JSON stay x–y.
 */
const NAMES: Record<AxisNaming, AxisNames> = {
  xy: { x: 'x', y: 'y', axis1: '1', axis2: '2' },
  yz: { x: 'y', y: 'z', axis1: 'u', axis2: 'v' },
}

export const axisNames = (axes: AxisNaming): AxisNames => NAMES[axes]

/** Axis names that stand alone in a symbol or sentence: x, y, xy, 1, 2, "axis 1". */
const AXIS = /(?<![\p{L}\d])(xy|x|y|1|2)(?![\p{L}\d])/gu

function renamed(text: string, axes: AxisNaming): string {
  if (axes === 'xy') return text
  const { x, y, axis1, axis2 } = NAMES[axes]
  const to: Record<string, string> = { x, y, xy: `${x}${y}`, 1: axis1, 2: axis2 }
  return text.replace(AXIS, (name) => to[name])
}

/** A figure's symbol by the team's settings: EN (W el, W pl) or US (S, Z), its axes as the team names them. */
export function figureSymbol({ symbol }: Pick<Figure, 'symbol'>, { axes, symbols }: NamingSettings): FigureSymbol {
  const { base, sub } = symbol[symbols]
  return sub === undefined ? { base: renamed(base, axes) } : { base: renamed(base, axes), sub: renamed(sub, axes) }
}

/** A figure's word with the team's axis names: "second moment about x" is "second moment about y" where axes are y–z. */
export const figureWord = ({ word }: Pick<Figure, 'word'>, { axes }: Pick<NamingSettings, 'axes'>): string => renamed(word, axes)

/** One sentence for print: what the team's names mean in the drawing. */
export function namingSentence(axes: AxisNaming): string {
  const { x, y, axis1, axis2 } = NAMES[axes]
  const along = axes === 'yz' ? ', x along the member' : ''
  return (
    `${x} to the right, ${y} up as drawn${along}; I${x} = ∫${y}² dA, I${y} = ∫${x}² dA, I${x}${y} = +∫${x}${y} dA about the centroid; ` +
    `θ counter-clockwise from +${x} to axis ${axis1} (major), axis ${axis2} = axis ${axis1} turned +90°.`
  )
}
