import { type Finding, type FindingParams, type FindingRow, makeFinding, placeText } from '../finding'

const shortNumber = (value: number) => String(Number(value.toPrecision(4)))
const text = (value: FindingParams[string]) => (typeof value === 'number' ? shortNumber(value) : String(value))
const place = placeText
/** The torsion constant as it is, and the other way, where they are known. */
const constants = ({ j, jOther }: FindingParams, other: string, consequence: string) =>
  j === undefined ? `; ${other}, ${consequence}.` : `, with J = ${text(j)} mm⁴; ${other}, J = ${text(jOther)} mm⁴.`

/** What combining outlines can report. Lengths in the sentences are mm, places drawing units. */
export const COMBINE_FINDINGS = {
  'make-up-needed': {
    severity: 'error',
    say: (p) =>
      `${text(p.count)} outlines cross one another, those at ${text(p.places)}: metal or void cannot be told from nesting. State a make-up, what each outline does: add, cut, common or out; of an outline drawn twice, leave one out.`,
  },
  'make-up-point-off': {
    severity: 'warning',
    say: (p) =>
      `Step ${text(p.step)} of the make-up names the point ${place(p)}, but the nearest outline is ${text(p.distance)} mm away. Check that the make-up belongs to this drawing.`,
  },
  'part-point-off': {
    severity: 'warning',
    say: (p) =>
      `The part names an outline by the point ${place(p)}, but the nearest one is ${text(p.distance)} mm away. Check that it is the one that is meant.`,
  },
  'part-not-found': {
    severity: 'error',
    say: (p) =>
      `No outline lies at ${place(p)}, where the part was picked: the nearest one is ${text(p.distance)} mm away. Pick it again.`,
  },
  'faces-undecided': {
    severity: 'error',
    say: (p) =>
      p.count === 1
        ? `1 area enclosed by branching edges, at ${place(p)}, waits for an answer: metal or void? Answer it, state a make-up, or leave out the lines that are no boundary.`
        : `${text(p.count)} areas enclosed by branching edges, the first at ${place(p)}, wait for an answer: metal or void? Answer them, state a make-up, or leave out the lines that are no boundary.`,
  },
  'no-outlines': {
    severity: 'error',
    say: () => 'No closed outline is taken, so there is no metal. Check layers, part and make-up.',
  },
  'no-metal': {
    severity: 'error',
    say: () => 'The make-up leaves no metal at all. Check the order of its steps and what each outline does.',
  },
  'outlines-abut': {
    severity: 'warning',
    say: (p) =>
      `${text(p.count)} outlines share edges with a neighbour over ${text(p.length)} mm, the first at ${place(p)}: taken as one piece there. Leave one out, or state a make-up, if they are not joined.`,
  },
  'too-many-crossings': {
    severity: 'error',
    say: (p) =>
      `The outlines at ${place(p)} cross one another more than ${text(p.most)} times. Such a drawing is not a cross-section; take fewer layers or outlines.`,
  },
  'boundary-unclear': {
    severity: 'error',
    say: (p) =>
      `Near ${place(p)} edges run so close to one another that inside and outside cannot be told apart. Clean the drawing there, or leave one of the outlines out.`,
  },
  sliver: {
    severity: 'warning',
    say: (p) =>
      `A sliver of metal of ${text(p.area)} mm² and ${text(p.width)} mm mean width lies at ${place(p)}; it counts in the figures. Were two outlines meant to meet there?`,
  },
  'sliver-void': {
    severity: 'warning',
    say: (p) =>
      `A closed slit of ${text(p.area)} mm² and ${text(p.width)} mm mean width lies in the metal at ${place(p)}. It is kept as void; as metal it would change torsion greatly. Check the drawing there.`,
  },
  'overlap-thin': {
    severity: 'warning',
    say: (p) =>
      `Outlines overlap or part by only ${text(p.width)} mm over ${text(p.length)} mm at ${place(p)}. Taken as drawn; were they meant to touch or to coincide there?`,
  },
  slit: {
    severity: 'warning',
    say: (p) =>
      `A slit only ${text(p.gap)} mm wide runs ${text(p.length)} mm at ${place(p)}. It is kept open${constants(p, 'closed', 'torsion would be far greater')} Open or closed: a person must know.`,
  },
  'wall-answered': {
    severity: 'note',
    say: (p) =>
      `The metal only ${text(p.width)} mm thick over ${text(p.length)} mm at ${place(p)} is ${text(p.is)} by a person's answer.`,
  },
  'narrow-changed': {
    severity: 'note',
    say: (p) =>
      `By a person's answer ${text(p.area)} mm² of metal were ${p.does === 'add' ? 'added in gaps' : 'cut where walls were too thin'}.`,
  },
  'wall-thin': {
    severity: 'warning',
    say: (p) =>
      `The metal is only ${text(p.width)} mm thick over ${text(p.length)} mm at ${place(p)}. It is kept as drawn${constants(p, 'without it', 'torsion may be far smaller')} Is it meant, or should the outlines touch or part there?`,
  },
  gap: {
    severity: 'warning',
    say: (p) =>
      `Two pieces lie only ${text(p.gap)} mm apart over ${text(p.length)} mm at ${place(p)}: bonded, in contact, or void? They are taken as apart${constants(p, 'bonded', 'they would act as one')}`,
  },
  'gap-answered': {
    severity: 'note',
    say: (p) => `The gap of ${text(p.gap)} mm over ${text(p.length)} mm at ${place(p)} is ${text(p.is)} by a person's answer.`,
  },
  'material-overlap': {
    severity: 'warning',
    say: (p) =>
      `${text(p.first)} and ${text(p.second)} overlap by ${text(p.area)} mm² at ${place(p)}; the later step, ${text(p.second)}, holds there. Bonded, in contact, or void?`,
  },
  'overlap-answered': {
    severity: 'note',
    say: (p) =>
      `The overlap of ${text(p.first)} and ${text(p.second)} (${text(p.area)} mm²) at ${place(p)} is ${text(p.is)} by a person's answer.`,
  },
} satisfies Record<string, FindingRow>

export type CombineCode = keyof typeof COMBINE_FINDINGS

export const combineFinding = (
  code: CombineCode,
  params: FindingParams,
  at?: [number, number],
  size?: number,
): Finding<CombineCode> => makeFinding<Record<CombineCode, FindingRow>, CombineCode>(COMBINE_FINDINGS, code, params, at, size)
