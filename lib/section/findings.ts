import type { FindingRow } from '../geometry/finding'

const percent = (value: unknown): string => `${(100 * Number(value)).toFixed(0)} %`

/** What the section has to say beside its figures. */
export const SECTION_FINDINGS = {
  'no-metal': {
    severity: 'error',
    say: () => 'The make-up leaves no metal, so there is nothing to compute. Check which outlines add and which cut.',
  },
  'too-thin': {
    severity: 'error',
    say: () =>
      'The metal is so thin for its size, or lies so far from the drawing’s origin, that its figures would be rounding. ' +
      'Check the unit, and move the drawing near its origin.',
  },
  'all-axes-principal': {
    severity: 'note',
    say: () =>
      'I1 and I2 are equal within what the drawing’s digits can tell, so every axis through the centroid is a principal axis: ' +
      'no angle θ and no moduli about axes 1 and 2 are given.',
  },
  'pieces-not-joined': {
    severity: 'warning',
    say: ({ pieces }) =>
      `The section is ${pieces} pieces that are not joined. Second moments and moduli suppose that they act as one; ` +
      'the sums of the pieces’ own second moments, without Steiner terms, are given beside them.',
  },
  'plastic-axis-in-gap': {
    severity: 'note',
    say: ({ axis, from, to }) =>
      `The plastic neutral axis for bending about ${axis} may lie anywhere in the gap between ${from} mm and ${to} mm from the ` +
      'centroid with the same plastic modulus; the middle is shown.',
  },
  'free-plastic-lower': {
    severity: 'note',
    say: ({ axis, part }) =>
      `A moment about ${axis} alone reaches only ${percent(part)} of the plastic modulus about ${axis}: the section is not ` +
      'symmetric, and the full modulus needs a moment about the other axis with it.',
  },
  'torsion-not-sought': {
    severity: 'note',
    say: ({ edges, pieces }) =>
      `Torsion and shear figures are not given for a section this large (edges: ${edges}, pieces: ${pieces}; at most 1,500 edges ` +
      'in 4 pieces). Take a part of the drawing to have them.',
  },
  'torsion-not-found': {
    severity: 'note',
    say: () =>
      'Torsion and shear figures could not be found: the metal is too thin somewhere for finite elements. The other figures stand.',
  },
} satisfies Record<string, FindingRow>

export type SectionFindingCode = keyof typeof SECTION_FINDINGS
