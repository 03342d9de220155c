import { FIGURES } from '../section/figures'
import type { Dimension, Figure, FigureGroup } from '../section/figures/figure'
import type { Section, SectionAnswer } from '../section/types'
import { survivingDigits } from '../units/digits'

const UNIT: Record<Dimension, string> = {
  length: 'mm',
  area: 'mm²',
  modulus: 'mm³',
  secondMoment: 'mm⁴',
  angle: '°',
  massPerLength: 'kg/m',
  perimeterFactor: 'mm per kg/m',
  ratio: '',
  count: '',
  warping: 'mm⁶',
}

const GROUP: Record<FigureGroup, string> = {
  size: 'Size',
  centroid: 'Centroid',
  bending: 'Bending about x and y',
  principal: 'Principal axes',
  plastic: 'Plastic bending',
}

const SHOWN = 10

/** The answer for people at a terminal: what was read, the figures by group, the findings. */
export function tableOf({ source, unit, outlinesTotal, findings, findingsTotal, section }: SectionAnswer): string {
  const lines = [
    `${source.name}, ${source.bytes} bytes, SHA-256 ${source.sha256}`,
    `1 drawing unit (${unit.drawing}) = ${unit.mmPerUnit} mm; declared: ${unit.declared}; ${outlinesTotal} outlines`,
  ]
  if (section) for (const group of Object.keys(GROUP) as FigureGroup[]) lines.push('', GROUP[group], ...rowsOf(group, section))
  if (findings.length > 0) lines.push('', `Findings (${findingsTotal})`)
  for (const { severity, message } of findings.slice(0, 50)) lines.push(`  ${severity}: ${message}`)
  if (findingsTotal > 50) lines.push(`  … and ${findingsTotal - 50} more (--json lists them)`)
  return lines.join('\n')
}

function rowsOf(group: FigureGroup, section: Section): string[] {
  const shown = FIGURES.filter((figure) => figure.group === group && figure.value(section) !== undefined)
  const rows = shown.map((figure) => [symbolOf(figure), shownValue(figure, section), UNIT[figure.dimension], figure.word])
  const widths = [0, 1, 2].map((column) => Math.max(0, ...rows.map((row) => row[column].length)))
  return rows.map(([symbol, value, unit, word]) =>
    `  ${symbol.padEnd(widths[0])}  ${value.padStart(widths[1])} ${unit.padEnd(widths[2])}  ${word}`.trimEnd(),
  )
}

const symbolOf = ({ symbol: { en } }: Figure) => en.base + (en.sub ? `_${en.sub}` : '')

/** Only the digits that the drawing's own, its repairs and the numerics leave. */
function shownValue(figure: Figure, section: Section): string {
  const value = figure.value(section)
  if (value === null || value === undefined) return '-'
  if (figure.dimension === 'count') return String(value)
  const { digits = 0, repairs = 0, numerics = 0 } = section.origin[figure.key]?.plusMinus ?? {}
  return survivingDigits(value, SHOWN, digits + repairs + numerics)
}
