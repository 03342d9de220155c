/**
 * Names of line types that draw no metal: hidden edges (dashed), centre lines (dash-dot) and phantom lines
 * (dash-dot-dot), in ISO 128 terms lines 02, 03, 04, 05, 08, 09, 10 and 12, with their German and French names.
 * Names of common practice, from memory, no source.
 */
const NO_METAL = new Set([
  'CENTER',
  'CENTRE',
  'DASHDOT',
  'HIDDEN',
  'DASHED',
  'PHANTOM',
  'DIVIDE',
  'MITTE',
  'STRICHPUNKT',
  'STRICHLINIE',
  'VERDECKT',
  'AXES',
  'CACHE',
  ...['02', '03', '04', '05', '08', '09', '10', '12'].map((n) => `ACAD_ISO${n}W100`),
])

/**
 * Whether a line type is left out by default. The prefix of an external drawing (`plan|CENTER`, `plan$0$CENTER`)
 * and the suffix of a scale (2, X2, 4, X4 …) say nothing.
 */
export function drawsNoMetal(lineType: string): boolean {
  const name = lineType.toUpperCase().replace(/^.*[|$]/, '')
  return (
    NO_METAL.has(name) ||
    NO_METAL.has(name.replace(/_?X?\d+(\.\d+)?$/, '')) ||
    NO_METAL.has(name.replace(/^JIS_0[289]_.*$/, 'CENTER'))
  )
}
