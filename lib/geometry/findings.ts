import { type Finding, type FindingParams, type FindingRow, makeFinding, placeText } from './finding'

const text = (value: FindingParams[string]) => (typeof value === 'number' ? shortNumber(value) : String(value))
const shortNumber = (value: number) => (Number.isInteger(value) ? String(value) : String(Number(value.toPrecision(6))))
const plural = (n: FindingParams[string], one: string, many: string) => (n === 1 ? `1 ${one}` : `${text(n)} ${many}`)
const mm = (value: FindingParams[string]) => `${typeof value === 'number' ? roundedMm(value) : value} mm`
const roundedMm = (value: number) => (Math.abs(value) >= 0.1 ? value.toFixed(2) : String(Number(value.toPrecision(3))))
const place = placeText
/** A gap wider than this (mm) is no lack of tolerance. */
const WIDEST_TO_CLOSE = 1
/** ΔA, and ΔI where they are known. */
const changes = ({ area, dIx, dIy }: FindingParams) =>
  `the area by ${text(area)} mm²${dIx === undefined ? '' : `, Ix by ${text(dIx)} mm⁴ and Iy by ${text(dIy)} mm⁴`}`

/**
 * What chaining, nesting and grouping can report. Lengths in the sentences are mm, places drawing units.
 */
export const GEOMETRY_FINDINGS = {
  'gaps-within-digits': {
    severity: 'note',
    say: (p) =>
      `${plural(p.count, 'gap', 'gaps')} between ends, at most ${mm(p.widest)}, ${p.count === 1 ? 'is' : 'are'} no wider than the drawing's last digits explain; closed.`,
  },
  'gap-closed': {
    severity: 'warning',
    say: (p) =>
      `A gap of ${mm(p.gap)} at ${place(p)} was closed (${p.how})${p.area === 0 ? '' : `; another reasonable closing would change ${changes(p)}`}. Check the drawing there.`,
  },
  'chain-open': {
    severity: 'warning',
    say: (p) => {
      const [from, to] = [placeText({ x: p.x0, y: p.y0 }), placeText({ x: p.x1, y: p.y1 })]
      if (p.edges === 1 && Number(p.gap) > WIDEST_TO_CLOSE) {
        return `An edge from ${from} to ${to} belongs to no outline and encloses no metal. Is it a centre line, hatching or construction? Else join it to its neighbours in the drawing.`
      }
      const cure = Number(p.gap) <= WIDEST_TO_CLOSE ? 'Raise the tolerance to close it, or close' : 'Close'
      return `${mm(p.gap)} open at ${place(p)}: a chain of ${plural(p.edges, 'edge', 'edges')} ends at ${from} and ${to} and encloses no metal. ${cure} it in the drawing.`
    },
  },
  'ends-ambiguous': {
    severity: 'error',
    say: (p) =>
      `${plural(p.ends, 'end', 'ends')} lie within ${mm(p.width)} at ${place(p)}, wider than the tolerance as a whole: which belong together is not clear, so none was joined. Lower the tolerance, or mend the drawing there.`,
  },
  branches: {
    severity: 'warning',
    say: (p) =>
      `More than two edges share an end near ${place(p)}, and ${plural(p.edges, 'edge bounds', 'edges bound')} nothing there; left out. Remove extra edges in the drawing, or leave out their layer.`,
  },
  'face-metal-or-void': {
    severity: 'warning',
    say: (p) =>
      `Edges that branch enclose an area of ${text(p.area)} mm² at ${place(p)}: metal or void? Answer on the drawing, or say what each outline does.`,
  },
  'face-answered': {
    severity: 'note',
    say: (p) => `The area of ${text(p.area)} mm² at ${place(p)}, enclosed by branching edges, is ${p.is} by a person's answer.`,
  },
  'edges-doubled': {
    severity: 'warning',
    say: (p) =>
      `${plural(p.count, 'edge', 'edges')} drawn twice or on top of one another (${mm(p.length)} in all, the first at ${place(p)}); each was taken once.`,
  },
  'edges-without-length': {
    severity: 'note',
    say: (p) => `${plural(p.count, 'edge', 'edges')} without length, the first at ${place(p)}; left out.`,
  },
  'outlines-coincident': {
    severity: 'warning',
    say: (p) =>
      `${plural(p.count, 'closed outline lies', 'closed outlines lie')} on another one, the first at ${place(p)}; counted once.`,
  },
  'outline-without-area': {
    severity: 'warning',
    say: (p) =>
      `A closed chain of ${plural(p.edges, 'edge', 'edges')} at ${place(p)} encloses no area, as it runs back over itself; left out. Check the drawing there.`,
  },
  'outline-thin': {
    severity: 'warning',
    say: (p) =>
      `An outline at ${place(p)} is only ${mm(p.width)} wide (twice its area by its perimeter). It counts; check that it is meant.`,
  },
  'outlines-cross': {
    severity: 'warning',
    say: (p) =>
      `${plural(p.count, 'outline crosses', 'outlines cross')} another one, the first at ${place(p)}: nesting cannot tell metal from void there. Say what each outline does.`,
  },
  'outlines-touch': {
    severity: 'note',
    say: (p) =>
      `${plural(p.count, 'outline touches', 'outlines touch')} another one, the first at ${place(p)}. Where they meet at a point only there is no wall and no joint: torsion is taken as open, and pieces as not joined.`,
  },
  'outline-crosses-itself': {
    severity: 'error',
    say: (p) => `An outline crosses itself at ${place(p)}. Mend it in the drawing, or leave the outline out.`,
  },
  'outline-touches-itself': {
    severity: 'note',
    say: (p) => `An outline touches itself, or runs back over itself, at ${place(p)}; zero wall or zero gap there.`,
  },
  'crossings-too-many': {
    severity: 'error',
    say: () =>
      'The outlines cross in more places than can be worked out. Leave out the layers with hatching or construction lines.',
  },
  'groups-apart': {
    severity: 'note',
    say: (p) =>
      `${plural(p.groups, 'group', 'groups')} of outlines lie apart from one another (details of a sheet?). Pick the one to use, or keep all.`,
  },
  'frame-found': {
    severity: 'warning',
    say: (p) =>
      `A rectangle of ${text(p.width)} × ${text(p.height)} mm at ${place(p)} lies round everything: a drawing frame? Leave it out unless it is metal.`,
  },
  'title-block-found': {
    severity: 'warning',
    say: (p) =>
      p.count === 1
        ? `1 area at ${place(p)} looks like a title block or table. Leave it out unless it is metal.`
        : `${text(p.count)} areas, the first at ${place(p)}, look like a title block or table. Leave them out unless they are metal.`,
  },
  'chords-on-circle': {
    severity: 'note',
    say: (p) =>
      `${plural(p.chords, 'short chord lies', 'short chords lie')} on one circle of radius ${mm(p.radius)} at ${place(p)}: an arc exploded by another program? As an arc it changes ${changes(p)}.`,
  },
  'arcs-from-chords': {
    severity: 'note',
    say: (p) =>
      `${plural(p.count, 'run', 'runs')} of chords taken as ${p.count === 1 ? 'an arc' : 'arcs'} by a person's choice; the area changes by ${text(p.area)} mm².`,
  },
  'arc-run-not-found': {
    severity: 'warning',
    say: (p) => `The run of chords accepted as an arc at ${place(p)} is not in the drawing; ignored. Look at it again.`,
  },
} satisfies Record<string, FindingRow>

export type GeometryCode = keyof typeof GEOMETRY_FINDINGS

export const geometryFinding = (
  code: GeometryCode,
  params: FindingParams,
  at?: [number, number],
  size?: number,
): Finding<GeometryCode> => makeFinding<Record<GeometryCode, FindingRow>, GeometryCode>(GEOMETRY_FINDINGS, code, params, at, size)
