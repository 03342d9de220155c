/** What a file that is no DXF is, and what to do. */
export interface OtherFile {
  what: string
  cure: string
}

const SAVE_AS = 'Open it in the program that made it and save or export it as DXF.'
const OUTLINES = 'Upload the DXF of the profile; a picture holds no exact outline.'

/** First bytes of files that are mistaken for DXF. */
const SIGNATURES: [number[] | string, string, string][] = [
  ['AC1.', 'a DWG', SAVE_AS],
  ['AC10', 'a DWG', SAVE_AS],
  ['AC2.', 'a DWG', SAVE_AS],
  ['MC0.0', 'a DWG', SAVE_AS],
  ['%PDF', 'a PDF', OUTLINES],
  ['PK\u0003\u0004', 'a ZIP archive (or an office document)', 'Unpack it and upload the DXF in it.'],
  ['PK\u0005\u0006', 'an empty ZIP archive', 'Pack the DXF again, or upload it as it is.'],
  ['Rar!', 'a RAR archive', 'Unpack it and upload the DXF in it.'],
  ['7z\u00bc\u00af', 'a 7z archive', 'Unpack it and upload the DXF in it.'],
  [[0x1f, 0x8b], 'a gzip archive', 'Unpack it and upload the DXF in it.'],
  [[0x89, 0x50, 0x4e, 0x47], 'a PNG picture', OUTLINES],
  [[0xff, 0xd8, 0xff], 'a JPEG picture', OUTLINES],
  ['GIF8', 'a GIF picture', OUTLINES],
  ['II*\u0000', 'a TIFF picture', OUTLINES],
  ['MM\u0000*', 'a TIFF picture', OUTLINES],
  ['BM', 'a BMP picture', OUTLINES],
  ['RIFF', 'a picture, sound or film', OUTLINES],
  ['ISO-10303-21', 'a STEP file', SAVE_AS],
  ['{\\rtf', 'a text document', 'Upload the DXF of the profile.'],
  ['%!PS', 'a PostScript file', OUTLINES],
  ['(DWF V', 'a DWF', SAVE_AS],
  ['solid ', 'an STL file', SAVE_AS],
  ['\u007fELF', 'a program', 'Upload the DXF of the profile.'],
  ['MZ', 'a program', 'Upload the DXF of the profile.'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an office document or part file', SAVE_AS],
]

const startsWith = (bytes: Uint8Array, start: number, signature: number[] | string): boolean => {
  for (let i = 0; i < signature.length; i++) {
    const wanted = typeof signature === 'string' ? signature.charCodeAt(i) : signature[i]
    if (bytes[start + i] !== wanted) return false
  }
  return true
}

/** Names the kind of a file by its content where it is no DXF (nor empty); null where it may be one. */
export function otherFileKind(bytes: Uint8Array, start: number): OtherFile | null {
  let i = start
  while (i < bytes.length && (bytes[i] === 32 || bytes[i] === 9 || bytes[i] === 10 || bytes[i] === 13)) i++
  if (startsWithCode(bytes, i)) return isIges(bytes, start) ? { what: 'an IGES file', cure: SAVE_AS } : null
  for (const [signature, what, cure] of SIGNATURES) if (startsWith(bytes, i, signature)) return { what, cure }
  if (isIges(bytes, start)) return { what: 'an IGES file', cure: SAVE_AS }
  return markup(bytes, i) ?? plain(bytes, i)
}

/** Whether a line holds a whole number and nothing else: the first group code. */
function startsWithCode(bytes: Uint8Array, start: number): boolean {
  let i = start
  while (i < bytes.length && bytes[i] >= 48 && bytes[i] <= 57 && i - start < 5) i++
  if (i === start) return false
  while (i < bytes.length && (bytes[i] === 32 || bytes[i] === 9)) i++
  return i >= bytes.length || bytes[i] === 10 || bytes[i] === 13
}

/** IGES: lines of 80 columns with the section's letter in column 73 and a number behind it. */
const isIges = (bytes: Uint8Array, start: number): boolean =>
  bytes[start + 72] === 83 && /^ *0*1\s*$/.test(String.fromCharCode(...bytes.subarray(start + 73, start + 80)))

function markup(bytes: Uint8Array, start: number): OtherFile | null {
  if (bytes[start] !== 60) return null
  const head = String.fromCharCode(...bytes.subarray(start, start + 2000)).toLowerCase()
  if (head.includes('<svg'))
    return { what: 'an SVG picture', cure: 'Export the drawing as DXF; SVG turns arcs and units into something else.' }
  if (head.includes('<html') || head.includes('<!doctype html')) {
    return { what: 'an HTML page', cure: 'It may be the sign-in or error page of another site; download the DXF again.' }
  }
  return { what: 'an XML file', cure: SAVE_AS }
}

function plain(bytes: Uint8Array, start: number): OtherFile {
  const head = bytes.subarray(start, start + 1000)
  let odd = 0
  for (const c of head) if (c === 0 || (c < 32 && c !== 9 && c !== 10 && c !== 13)) odd++
  const what = odd > 0 ? 'a file of another kind' : 'a text'
  return { what, cure: 'A DXF begins with a group code. Save the drawing as DXF and upload that.' }
}
