import type { Finding } from '@/lib/geometry/finding'
import type { Bond, XY } from '@/lib/geometry/recipe'
import type { PreviewResult } from '@/lib/jobs/browser-pool'
import type { FlowAction } from './flow'

/** What a person can do about a finding with one click; every one of them is a change of the recipe. */
export interface Remedy {
  word: string
  action: FlowAction
}

const set = (word: string, change: Extract<FlowAction, { type: 'set' }>['change']): Remedy => ({
  word,
  action: { type: 'set', change },
})

/** Half a last digit above the gap, in two digits: 0.0123 → 0.013. */
function toleranceFor(gap: number): number {
  const step = 10 ** (Math.floor(Math.log10(gap)) - 1)
  return Number((Math.ceil(gap / step + 0.5) * step).toPrecision(3))
}

export function remediesOf({ code, params, at }: Finding, result: PreviewResult): Remedy[] {
  const { drawing, outlines, answer } = result
  const { tallies } = drawing
  const left = (list: typeof tallies.layers) => list.filter((tally) => tally.taken + tally.left > 0).map(({ name }) => name)
  const answers = (words: readonly (readonly [Bond['is'], string])[]): Remedy[] =>
    at ? words.map(([is, word]) => ({ word, action: { type: 'bond', bond: { at, is } } })) : []
  switch (code) {
    case 'face-metal-or-void':
      return answers([
        ['metal', 'It is metal'],
        ['void', 'It is void'],
      ])
    case 'gap':
      return answers([
        ['bonded', 'Bonded'],
        ['contact', 'In contact'],
        ['void', 'Apart'],
      ])
    case 'material-overlap':
      return answers([
        ['bonded', 'Bonded'],
        ['contact', 'In contact'],
      ])
    case 'slit':
      return answers([
        ['void', 'It is open'],
        ['metal', 'It is closed'],
      ])
    case 'wall-thin':
      return answers([
        ['metal', 'It is metal'],
        ['void', 'It is open'],
      ])
    case 'chain-open':
      return typeof params.gap === 'number' && params.gap > 0 && params.gap < 5
        ? [set(`Close gaps up to ${toleranceFor(params.gap)} mm`, { tolerance: toleranceFor(params.gap) })]
        : []
    case 'frame-found':
    case 'title-block-found':
      return [set('Leave frame and title block out', { part: withoutSheetParts(result) })]
    case 'only-on-layouts':
      return tallies.spaces
        .slice(1)
        .flatMap(({ name, taken, left: n }) => (taken + n > 0 ? [set(`Take layout ${name}`, { space: name })] : []))
    case 'only-on-hidden':
      return [{ word: 'Take all layers', action: { type: 'layers', names: left(tallies.layers) } }]
    case 'only-on-line-types':
      return [{ word: 'Take all line types', action: { type: 'lineTypes', names: left(tallies.lineTypes) } }]
    case 'only-hatches':
      return [set('Take the hatch boundaries', { hatches: true })]
    case 'unit-differs':
      return drawing.declaredMm
        ? [set(`Read it in ${drawing.declared}`, { unit: unitNamed(drawing.declared) ?? drawing.declaredMm })]
        : []
    case 'chords-on-circle': {
      const offer = outlines.arcOffers.find(({ run }) => at && run.through[0] === at[0] && run.through[1] === at[1])
      return offer ? [{ word: 'Take as arc', action: { type: 'arc', run: offer.run, accept: true } }] : []
    }
    case 'outlines-none':
    case 'ends-ambiguous':
      return [set('Read with a tolerance of 0.1 mm', { tolerance: Math.max(0.1, 10 * answer.recipe.tolerance) })]
    default:
      return []
  }
}

const NAMES = ['mm', 'cm', 'm', 'in', 'ft'] as const
const unitNamed = (name: string) => NAMES.find((unit) => unit === name)

/** A point on each outline that is neither frame nor title block. */
function withoutSheetParts({ outlines }: PreviewResult): XY[] {
  const aside = new Set([...outlines.frames, ...outlines.titleBlocks.flat()])
  const part: XY[] = []
  for (let k = 0; k < outlines.count; k++) if (!aside.has(k)) part.push([outlines.at[2 * k], outlines.at[2 * k + 1]])
  return part
}
