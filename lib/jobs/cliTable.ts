import type { Finding, Severity } from '../geometry/finding'
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
  torsion: 'Torsion and shear',
}

const SHOWN = 10
const IN_FULL = 5

/** The answer for people at a terminal: what was read, the figures by group, the findings. */
export function tableOf({ source, unit, outlinesTotal, findings, findingsTotal, section }: SectionAnswer): string {
  const lines = [
    `${source.name}, ${source.bytes} bytes, SHA-256 ${source.sha256}`,
    `1 drawing unit (${unit.drawing}) = ${unit.mmPerUnit} mm; declared: ${unit.declared}; ${outlinesTotal} outlines`,
  ]
  if (section) for (const group of Object.keys(GROUP) as FigureGroup[]) lines.push('', GROUP[group], ...rowsOf(group, section))
  if (findings.length > 0) lines.push('', `Findings (${findingsTotal})`)
  lines.push(...findingRows(findings))
  return lines.join('\n')
}

const SEVERITIES: readonly Severity[] = ['error', 'warning', 'note']

/** Gravest first; of one code only the first few in full. */
function findingRows(findings: Finding[]): string[] {
  const counts = new Map<string, number>()
  const sorted = SEVERITIES.flatMap((severity) => findings.filter((finding) => finding.severity === severity))
  const rows = sorted.flatMap(({ code, severity, message }) => {
    const count = (counts.get(code) ?? 0) + 1
    counts.set(code, count)
    return count <= IN_FULL ? [`  ${severity}: ${message}`] : []
  })
  for (const [code, count] of counts)
    if (count > IN_FULL) rows.push(`  … and ${count - IN_FULL} more of ${code} (--json lists them)`)
  return rows
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
