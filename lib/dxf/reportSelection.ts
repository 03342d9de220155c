import type { Drawing } from './drawing'
import type { FindingList } from './findingList'
import { type DxfCode, dxfFinding, quoted } from './findings'
import {
  HATCH,
  OTHER_LAYER,
  OTHER_LINE_TYPE,
  OTHER_SPACE,
  PATTERN,
  type Selecting,
  spaceIndex,
  TAKEN,
  type Tallies,
  UNSEEN,
} from './select'

const LISTED_NAMES = 12

/** Says what the selection takes with remarks, what it leaves out, and what it might have meant. */
export function reportSelection(
  drawing: Drawing,
  selecting: Selecting,
  why: Uint8Array,
  gave: Uint8Array,
  tallies: Tallies,
  findings: FindingList,
): void {
  reportUnknownNames(drawing, selecting, findings)
  reportRemarks(drawing, why, findings)
  const left = new Left(drawing, why, gave)
  left.report(findings)
  const takes = tallies.kinds.some(({ taken }) => taken > 0)
  // where something could not be read, that is what there is to say
  const faulty = [...drawing.findings, ...findings.items].some(({ severity }) => severity === 'error')
  if (!takes && !faulty) left.reportNothing(drawing, findings)
}

function reportUnknownNames(drawing: Drawing, { layers, lineTypes, space }: Selecting, findings: FindingList): void {
  const missing = (wanted: readonly string[] | null, has: readonly string[]) => {
    const known = new Set(has.map((name) => name.toUpperCase()))
    return (wanted ?? []).filter((name) => !known.has(name.toUpperCase()))
  }
  const layerNames = drawing.layers.map(({ name }) => name)
  for (const layer of missing(layers, layerNames)) findings.add('layer-not-found', () => dxfFinding('layer-not-found', { layer }))
  for (const lineType of missing(lineTypes, drawing.lineTypes)) {
    findings.add('line-type-not-found', () => dxfFinding('line-type-not-found', { lineType }))
  }
  if (spaceIndex(drawing.spaces, space) < 0) {
    findings.add('space-not-found', () =>
      dxfFinding('space-not-found', { space, has: drawing.spaces.map((s) => quoted(s)).join(', ') }),
    )
  }
}

function reportRemarks({ entities, remarks }: Drawing, why: Uint8Array, findings: FindingList): void {
  const taken = new Uint8Array(remarks.length + 1)
  const left = new Uint8Array(remarks.length + 1)
  for (let row = 0; row < entities.count; row++) {
    const at = why[row] === TAKEN ? taken : left
    at[entities.remark[row]] = 1
  }
  let first = ''
  let count = 0
  for (let i = 0; i < remarks.length; i++) {
    for (const finding of remarks[i]) {
      if (taken[i + 1] === 1) findings.add(finding.code, () => finding)
      else if (left[i + 1] === 1 && finding.severity === 'error') {
        count++
        if (first === '') first = finding.message
      }
    }
  }
  if (count > 0) findings.add('faults-left-out', () => dxfFinding('faults-left-out', { count, first }))
}

/** Counts, by name, of the entities that gave edges and were left out. */
class Left {
  private readonly layers = new Map<string, number>()
  private readonly lineTypes = new Map<string, number>()
  private readonly layouts = new Map<string, number>()
  private unseen = 0
  private hatches = 0
  private patterns = 0

  constructor({ entities, layers, lineTypes, spaces }: Drawing, why: Uint8Array, gave: Uint8Array) {
    const add = (to: Map<string, number>, name: string) => to.set(name, (to.get(name) ?? 0) + 1)
    for (let row = 0; row < entities.count; row++) {
      if (gave[row] === 0) continue
      if (why[row] === OTHER_SPACE) add(this.layouts, spaces[entities.space[row]])
      else if (why[row] === HATCH) this.hatches++
      else if (why[row] === PATTERN) this.patterns++
      else if (why[row] === UNSEEN) this.unseen++
      else if (why[row] === OTHER_LAYER) {
        const { name, off, frozen, plots } = layers[entities.layer[row]]
        const state = frozen ? 'frozen' : off ? 'off' : plots ? 'not chosen' : 'not plotting'
        add(this.layers, `${quoted(name)} (${state})`)
      } else if (why[row] === OTHER_LINE_TYPE) add(this.lineTypes, quoted(lineTypes[entities.lineType[row]]))
    }
  }

  report(findings: FindingList): void {
    const say = (code: DxfCode, counts: Map<string, number>) => {
      if (counts.size > 0) findings.add(code, () => dxfFinding(code, { count: sum(counts), list: listed(counts) }))
    }
    say('layers-left-out', this.layers)
    say('line-types-left-out', this.lineTypes)
    say('layouts-left-out', this.layouts)
    const { unseen, hatches, patterns } = this
    if (unseen > 0) findings.add('invisible-left-out', () => dxfFinding('invisible-left-out', { count: unseen }))
    if (hatches > 0) findings.add('hatches-left-out', () => dxfFinding('hatches-left-out', { count: hatches }))
    if (patterns > 0) findings.add('patterns-left-out', () => dxfFinding('patterns-left-out', { count: patterns }))
  }

  /** Nothing is taken: where is the outline? */
  reportNothing(drawing: Drawing, findings: FindingList): void {
    const ask = (code: DxfCode, counts: Map<string, number>) => {
      if (counts.size > 0) findings.add(code, () => dxfFinding(code, { count: sum(counts), list: listed(counts) }))
      return counts.size > 0
    }
    const asked = [
      ask('only-on-hidden', this.layers),
      ask('only-on-line-types', this.lineTypes),
      ask('only-on-layouts', this.layouts),
    ]
    if (asked.includes(true)) return
    if (this.hatches > 0) {
      const count = this.hatches
      findings.add('only-hatches', () => dxfFinding('only-hatches', { count }))
      return
    }
    const kinds = Object.entries(drawing.ignored).map(([kind, n]) => `${n} ${quoted(kind)}`)
    if (this.patterns > 0) kinds.push(`${this.patterns} lines of hatch patterns`)
    const hint = kinds.length > 0 ? `It has ${kinds.slice(0, LISTED_NAMES).join(', ')}.` : 'It is empty.'
    findings.add('nothing-drawn', () => dxfFinding('nothing-drawn', { hint }))
  }
}

const sum = (counts: Map<string, number>): number => [...counts.values()].reduce((total, n) => total + n, 0)

function listed(counts: Map<string, number>): string {
  const names = [...counts].sort(([, m], [, n]) => n - m).map(([name, n]) => `${n} on ${name}`)
  const more = names.length - LISTED_NAMES
  return more > 0 ? `${names.slice(0, LISTED_NAMES).join(', ')} and ${more} more` : names.join(', ')
}
