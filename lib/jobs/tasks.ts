import type { Drawing, ReadLimits } from '../dxf/drawing'
import { readDrawing } from '../dxf/read'
import type { Tally } from '../dxf/select'
import type { RegionAnswer } from '../geometry/arrangement/regionOf'
import type { Finding } from '../geometry/finding'
import type { OutlineSet } from '../geometry/outlineSet'
import { mmPerUnit, type Recipe } from '../geometry/recipe'
import type { Region } from '../geometry/region'
import type { Combination } from '../opinions/combination'
import type { SectionAnswer } from '../section/types'
import { answerOf, type Source, type UsedMaterial } from './answer'
import { withGapMoments } from './gapMoments'
import { memo } from './memo'
import { withConstants } from './narrow'
import type { Role, Stage } from './previewProtocol'
import { unitFindings, withoutFarFaults, withoutMootQuestions } from './sayings'
import { chainStep, combineStep, figuresStep, keysOf, NO_FIGURES, torsionStep } from './steps'

export interface TaskResult {
  answer: SectionAnswer
  drawing: Drawing
  /** entities by layer, line type, kind and space, as the recipe takes or leaves them */
  tallies: { layers: Tally[]; lineTypes: Tally[]; kinds: Tally[]; spaces: Tally[] }
  /** drawing units, before the recipe's turn */
  outlines: OutlineSet
  roles: Role[]
  /** mm, turned; null without a section */
  region: Region | null
  /** the question to be put to other libraries; null without a section */
  combination: Combination | null
}

export type Extent = 'first' | 'all'
type Materials = Record<string, UsedMaterial>

/** One drawing, answered for one recipe after another; only what a change of the recipe touches is done again. */
export interface SectionTask {
  drawing: Drawing
  /** `extent` 'first' leaves out what finite elements give, so that a person sees all else at once */
  run: (recipe: Recipe, materials: Materials, onStage?: (stage: Stage) => void, extent?: Extent) => TaskResult
}

/** Bytes to drawing. */
export const readTask = (bytes: Uint8Array, limits?: ReadLimits): Drawing => readDrawing(bytes, limits)

/** Drawing and recipe to section, once. */
export const sectionTask = (drawing: Drawing, source: Source, recipe: Recipe, materials: Materials): TaskResult =>
  createTask(drawing, source).run(recipe, materials)

export function createTask(drawing: Drawing, source: Source): SectionTask {
  const chained = memo(chainStep)
  const combined = memo(combineStep)
  const figured = memo(figuresStep)
  const twisted = memo(torsionStep)
  const told = memo(withConstants)
  return {
    drawing,
    run(recipe, materials, onStage = () => {}, extent = 'all') {
      const keys = keysOf(recipe, materials)
      onStage('chain')
      const chain = chained(keys.chain, drawing, recipe)
      const { selection, outlines } = chain
      onStage('combine')
      const combine = combined(keys.combine, chain, recipe)
      const taken = combine.steps.map(({ outline }) => outline)
      const ofOutlines = withoutFarFaults(withoutMootQuestions(outlines.findings, outlines, taken), outlines, taken)
      const before = [drawing.findings, selection.findings, ofOutlines, combine.findings].flat()
      onStage('figures')
      const first = before.some(isError) ? NO_FIGURES : figured(keys.figures, drawing, combine, recipe, materials)
      const figures = extent === 'all' && first.section ? twisted(keys.figures, first) : first
      const narrow = told(keys.figures, combine, chain.tolerances, mmPerUnit(recipe), figures.section?.j?.value)
      const findings = [
        ...drawing.findings,
        ...selection.findings,
        ...withGapMoments(ofOutlines, combine.repairs, figures.repairs, figures.section),
        ...combine.findings.map((finding) => narrow.get(finding) ?? finding),
        ...figures.findings,
        ...unitFindings(drawing, recipe, figures.section),
      ]
      const unlisted = drawing.findingsTotal - drawing.findings.length + selection.findingsTotal - selection.findings.length
      const findingsTotal = findings.length + unlisted
      const section = findings.some(isError) ? null : figures.section
      const { layers, lineTypes, kinds, spaces } = selection
      return {
        answer: answerOf({ source, recipe, drawing, outlines, roles: combine.roles, findings, findingsTotal, section }),
        drawing,
        tallies: { layers, lineTypes, kinds, spaces },
        outlines,
        roles: combine.roles,
        region: section && figures.region,
        combination: section && {
          outlines,
          steps: stepsAsked(combine),
          area: section.area / mmPerUnit(recipe) ** 2 - combine.answered,
        },
      }
    },
  }
}

const isError = ({ severity }: Finding) => severity === 'error'

function stepsAsked({ steps }: RegionAnswer): Combination['steps'] {
  return steps.flatMap(({ outline, does }) => (does === 'out' ? [] : [{ outline, does }]))
}
