import { type Finding, type FindingParams, type FindingRow, makeFinding } from '../geometry/finding'

const text = (value: unknown) => String(value)

/** Findings of the whole task, beside those of reader, geometry and section. */
export const TASK_FINDINGS = {
  'unit-unconfirmed': {
    severity: 'warning',
    say: ({ by, unit }) =>
      `The unit (${text(unit)}) was given only by ${text(by)} and is unconfirmed: confirm it by a dimension known from elsewhere before release.`,
  },
  'unit-differs': {
    severity: 'warning',
    say: ({ declared, taken }) =>
      `The file says that its unit is ${text(declared)}, but it is read in ${text(taken)}: check one dimension.`,
  },
  'unit-size': {
    severity: 'warning',
    say: ({ width, height }) =>
      `The profile measures ${text(width)} × ${text(height)} mm, which is unusual for a section: check the unit.`,
  },
  'outlines-none': {
    severity: 'error',
    say: ({ open }) =>
      Number(open) > 0
        ? `No closed outline was found; ${text(open)} chains stay open. Close their gaps, trim lines that run past their corners, raise the tolerance or choose other layers.`
        : 'No closed outline was found: nothing that the recipe takes encloses an area. Check layers, line types and layouts.',
  },
  'opinion-disagrees': {
    severity: 'warning',
    say: ({ library, sentence }) =>
      `A second opinion disagrees (${text(library)}): ${text(sentence)} Do not use the figures before the difference is explained.`,
  },
  'material-unknown': {
    severity: 'warning',
    say: ({ material }) => `The recipe names the material ${text(material)}, which is not known here: no mass was computed.`,
  },
} satisfies Record<string, FindingRow>

export const taskFinding = (code: keyof typeof TASK_FINDINGS, params: FindingParams = {}): Finding =>
  makeFinding(TASK_FINDINGS, code, params)
