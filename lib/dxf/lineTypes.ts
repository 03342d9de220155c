/**
 * Words in the names of line types that draw no metal: hidden edges (dashed), centre lines (dash-dot) and phantom lines
 * (dash-dot-dot), in ISO 128 terms lines 02, 03, 04, 05, 08, 09, 10 and 12, with their German and French names; behind
 * them at most a scale (2, X2, 4, X4 …). Names of common practice, from memory, no source.
 */
const WORD =
  /(^|[^A-Z])(CENT(ER|RE)|HIDDEN|PHANTOM|DASH(ED|DOT)|DIVIDE|MITTE(LLINIE)?|STRICH(PUNKT|LINIE)|VERDECKT|AXES|CACHE)(X?\d|[^A-Z]|$)/
const NUMBERED = /ISO(0[234589]|1[02])W\d|^JIS_0[289]_/

/**
 * Whether a line type is left out by default. The prefix of an external drawing (`plan|CENTER`, `plan$0$CENTER`)
 * says nothing.
 */
export function drawsNoMetal(lineType: string): boolean {
  const name = lineType.toUpperCase().replace(/^.*[|$]/, '')
  return WORD.test(name) || NUMBERED.test(name)
}
