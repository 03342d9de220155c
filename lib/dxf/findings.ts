import { type Finding, type FindingParams, type FindingRow, makeFinding } from '../geometry/finding'

const number = (value: FindingParams[string]) =>
  typeof value === 'number'
    ? Number.isInteger(value)
      ? value.toLocaleString('en')
      : String(Number(value.toPrecision(6)))
    : String(value)
const plural = (n: FindingParams[string], one: string, many = `${one}s`) => `${number(n)} ${n === 1 ? one : many}`
const where = (p: FindingParams) =>
  [`${p.kind}`, p.handle && `handle ${p.handle}`, p.place && `${p.place} of the file`, p.block && `in block ${p.block}`]
    .filter(Boolean)
    .join(', ')
const error = (say: FindingRow['say']): FindingRow => ({ severity: 'error', say })
const warning = (say: FindingRow['say']): FindingRow => ({ severity: 'warning', say })
const note = (say: FindingRow['say']): FindingRow => ({ severity: 'note', say })

const AGAIN = 'Save the drawing again as DXF and upload that.'
const MEND = 'Mend or delete it in the drawing, or leave its layer out.'

/** What reading a file and choosing from it can report. Lengths are drawing units. */
export const DXF_FINDINGS = {
  'file-empty': error(() => 'The file is empty. Upload the DXF itself.'),
  'file-not-dxf': error((p) => `This is ${p.what}, not a DXF. ${p.cure}`),
  'file-too-large': error(
    (p) =>
      `The file has ${number(p.bytes)} bytes; this server takes ${number(p.limit)} (setting ${p.setting}). Purge the drawing, or delete what is not the profile.`,
  ),
  'file-cut': error((p) => `The file ends too early, at ${p.place} (${p.in}): it was cut off on its way. ${AGAIN}`),
  'file-broken': error(
    (p) => `A group code should stand at ${p.place}, and "${p.text}" does: from there on the file cannot be read. ${AGAIN}`,
  ),
  'file-without-eof': warning(
    (p) => `The file ends without EOF, at ${p.place}; the entities before it are complete and were read.`,
  ),
  'file-goes-on': note((p) => `What follows EOF at ${p.place} was not read.`),
  'file-without-sections': note(() => 'The file has no sections, only entities; read as model space.'),
  'sections-repeated': note((p) => `The ${p.section} section stands in the file ${number(p.count)} times; all were read.`),
  'too-many-entities': error(
    (p) =>
      `The drawing has more than ${number(p.limit)} entities (setting ${p.setting}). Delete what is not the profile and upload it again.`,
  ),
  'too-many-blocks': error((p) => `The file defines more than ${number(p.limit)} blocks. Purge the drawing and save it again.`),
  'too-many-after-opening': error(
    (p) =>
      `Blocks opened up, arrays and all, the drawing would have ${number(p.count)} entities; this server takes ${number(p.limit)} (setting ${p.setting}). Explode only the block that holds the profile and delete the rest.`,
  ),
  'nested-too-deep': error(
    (p) =>
      `Blocks are nested more than ${number(p.limit)} deep (setting ${p.setting}), by way of block ${p.block}. Explode the outer blocks.`,
  ),
  'block-holds-itself': error(
    (p) => `${where(p)}: block ${p.name} places itself (${p.chain}), so what it shows is not determined. Mend the block.`,
  ),
  'block-missing': error((p) => `${where(p)}: places block ${p.name}, which is not in the file. ${MEND}`),
  'block-external': error(
    (p) => `${where(p)}: places the external drawing ${p.name}, which is not in the file. Bind the reference and save again.`,
  ),
  'block-twice': error(
    (p) => `${where(p)}: block ${p.name} is defined more than once, differently; which one is meant is not clear. Rename one.`,
  ),
  'block-bad': error((p) => `${where(p)}: block ${p.name} has a base point that is no number. Mend the block.`),
  'insert-scale-zero': error((p) => `${where(p)}: places block ${p.name} at scale 0. ${MEND}`),
  'insert-array': error((p) => `${where(p)}: an array of ${p.columns} columns by ${p.rows} rows cannot be placed. ${MEND}`),

  'number-bad': error((p) =>
    p.text === ''
      ? `${where(p)}: the number of group ${p.code} (${p.at}) is empty. ${MEND}`
      : `${where(p)}: "${p.text}" (group ${p.code}, ${p.at}) is not a number. Write numbers with a decimal point and without a unit.`,
  ),
  'number-large': error(
    (p) =>
      `${where(p)}: ${p.text} (group ${p.code}, ${p.at}) is too large to compute with; the range ends at 1e12. Move or scale the drawing.`,
  ),
  'group-repeated': error((p) => `${where(p)}: ${p.what} (group ${p.code}) is given twice with different values. ${MEND}`),
  'group-missing': error((p) => `${where(p)}: ${p.what} (group ${p.code}) is missing. ${MEND}`),
  tilted: error(
    (p) =>
      `${where(p)}: is tilted out of the drawing plane (extrusion direction ${p.direction}). Turn it into the plane, or leave its layer out.`,
  ),
  'radius-bad': error((p) => `${where(p)}: its radius is ${p.radius}; a radius must be greater than 0. ${MEND}`),
  'arc-without-sweep': error(
    (p) => `${where(p)}: starts and ends at the same angle: nothing, or a full turn? Draw it as a full circle or ellipse.`,
  ),
  'ellipse-bad': error((p) => `${where(p)}: ${p.what}. ${MEND}`),
  'ellipse-ratio': note(
    (p) => `${where(p)}: the axis ratio ${p.ratio} is above 1, so major and minor axis are exchanged; read as it is written.`,
  ),
  'vertex-count': error((p) => `${where(p)}: says ${number(p.says)} vertices and has ${number(p.has)}. ${MEND}`),
  'vertex-incomplete': error(
    (p) => `${where(p)}: a vertex has no ${p.what} (${number(p.xs)} x and ${number(p.ys)} y values). ${MEND}`,
  ),
  'bulge-without-vertex': error(
    (p) => `${where(p)}: a bulge stands before the first vertex, so its arc is not determined. ${MEND}`,
  ),
  'polyline-without-vertices': warning(
    (p) => `${where(p)}: has ${plural(p.vertices, 'vertex', 'vertices')}, so it draws nothing; left out.`,
  ),
  'polyline-without-end': note(
    (p) => `${where(p)}: is not ended by SEQEND; its ${plural(p.vertices, 'vertex was', 'vertices were')} read.`,
  ),
  'polyline-width': warning(
    (p) =>
      `${where(p)}: has a width of ${p.width}: is it the centre line of a sheet? Its centre line was taken as an outline; draw the outline itself.`,
  ),
  'polyline-3d': note((p) => `${where(p)}: is a 3D polyline; all its vertices lie in one plane and were taken in plan.`),
  'polyline-mesh': warning((p) => `${where(p)}: is a ${p.what}, not an outline. Explode it to lines, or leave its layer out.`),
  'spline-frame-only': error(
    (p) => `${where(p)}: holds only its control frame, not the fitted curve. Save it again with the curve, or explode it.`,
  ),
  'heights-in-entity': warning(
    (p) =>
      `${where(p)}: lies at heights z from ${p.low} to ${p.high}; taken in plan. Is the profile drawn upright? Flatten it into the xy plane.`,
  ),
  'heights-differ': note((p) => `Entities lie at different heights, z from ${p.low} to ${p.high}; all were taken in plan.`),
  'no-length': note((p) => `${where(p)}: has no length; left out.`),
  'placed-too-far': error((p) => `${where(p)}: as placed it reaches beyond 1e12 units, too far to compute with. ${MEND}`),

  'spline-bad': error((p) => `${where(p)}: ${p.what}. ${MEND}`),
  'spline-fit-points': warning(
    (p) =>
      `${where(p)}: has fit points only. A cubic with chord-length parameters was laid through them (${p.ends}); with centripetal parameters it would lie up to ${number(p.difference)} elsewhere. Check it, or save the spline with control points.`,
  ),
  'hatch-bad': error((p) => `${where(p)}: ${p.what}. Leave hatch boundaries out, or make the hatch again.`),

  'entities-ignored': note((p) => `Left out, as they are no outlines: ${p.list}.`),
  'entities-unread': warning(
    (p) => `Not read, and perhaps metal: ${p.list}. Explode them to lines and arcs if they belong to the profile.`,
  ),
  'unit-unknown': warning((p) => `The file's unit code ($INSUNITS ${p.code}) is not known. State the unit.`),
  'unit-bad': warning((p) => `The file's unit ($INSUNITS) reads "${p.text}", which is no unit code. State the unit.`),
  'encoding-unknown': note(
    (p) =>
      `The file's code page ${p.page} is not known; names were read as windows-1252 and may look wrong. Figures are not touched.`,
  ),
  'dimension-contradicts': warning(
    (p) =>
      `A dimension on layer ${p.layer} says ${p.says} and measures ${number(p.measured)} (ratio ${number(p.ratio)}): not drawn to scale, another unit, or a text typed over. Check the size.`,
  ),
  'dimension-stale': warning(
    (p) =>
      `A dimension on layer ${p.layer} stores ${number(p.stored)}, but its points are ${number(p.measured)} apart. Check it.`,
  ),

  'faults-left-out': note(
    (p) =>
      `${plural(p.count, 'entity that could', 'entities that could')} not be read ${p.count === 1 ? 'is' : 'are'} on what is left out. The first: ${p.first}`,
  ),
  'layers-left-out': note((p) => `Left out by layer: ${p.list}.`),
  'line-types-left-out': note((p) => `Left out by line type (centre, hidden and phantom lines are no metal): ${p.list}.`),
  'invisible-left-out': note((p) => `${plural(p.count, 'invisible entity', 'invisible entities')} left out.`),
  'hatches-left-out': note(
    (p) => `${plural(p.count, 'hatch', 'hatches')} left out; their boundaries can be taken as outlines on request.`,
  ),
  'patterns-left-out': note((p) => `${plural(p.count, 'line', 'lines')} of hatch patterns (blocks named *X…) left out.`),
  'layouts-left-out': note((p) => `Left out, as drawn on layouts and not in the model: ${p.list}.`),
  'layer-not-found': warning((p) => `Layer ${p.layer}, which the recipe names, is not in the drawing.`),
  'line-type-not-found': warning((p) => `Line type ${p.lineType}, which the recipe names, is not in the drawing.`),
  'space-not-found': error((p) => `Layout ${p.space}, which the recipe names, is not in the drawing. It has: ${p.has}.`),
  'only-on-layouts': error(
    (p) => `0 outlines' entities in the model, ${number(p.count)} on layouts (${p.list}): take these? Choose the layout.`,
  ),
  'only-on-hidden': error(
    (p) =>
      `0 outlines' entities on the layers taken, ${number(p.count)} on layers left out (${p.list}): take these? Choose the layers.`,
  ),
  'only-on-line-types': error(
    (p) =>
      `0 outlines' entities of the line types taken, ${number(p.count)} of those left out (${p.list}): take these? Choose the line types.`,
  ),
  'only-hatches': error(
    (p) => `No outline is drawn but ${plural(p.count, 'hatch', 'hatches')}: take the hatch boundaries? Choose them.`,
  ),
  'nothing-drawn': error(
    (p) => `The drawing holds no outline: no line, arc, circle, ellipse, polyline or spline to take. ${p.hint}`,
  ),
} satisfies Record<string, FindingRow>

export type DxfCode = keyof typeof DXF_FINDINGS

/** Text from a file as it may stand in a sentence: control characters shown as blanks, long names cut. */
export function quoted(text: string, longest = 80): string {
  let clean = ''
  for (const c of text.slice(0, longest)) {
    const code = c.codePointAt(0) ?? 0
    clean += code < 32 || (code >= 127 && code < 160) || (code >= 0x202a && code <= 0x202e) ? ' ' : c
  }
  return text.length > longest ? `${clean}…` : clean
}

/** A finding of this folder; texts in its parameters are cut and cleaned for the sentence. */
export function dxfFinding(code: DxfCode, params: FindingParams = {}, at?: [number, number], size?: number): Finding<DxfCode> {
  const clean: FindingParams = {}
  for (const [key, value] of Object.entries(params)) clean[key] = typeof value === 'string' ? quoted(value, 400) : value
  return makeFinding<Record<DxfCode, FindingRow>, DxfCode>(DXF_FINDINGS, code, clean, at, size)
}
