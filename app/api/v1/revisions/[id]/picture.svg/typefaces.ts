import { readFile } from 'node:fs/promises'
import path from 'node:path'
import { type Typeface, typefaceOf } from '@/components/picture/typeface'

async function bytesOf(...parts: string[]): Promise<ArrayBuffer> {
  const bytes = await readFile(path.join(/* turbopackIgnore: true */ process.cwd(), ...parts))
  return new Uint8Array(bytes).buffer
}

const faceFile = (name: string) => bytesOf('node_modules', '@fontsource', name, 'files', `${name}-latin-400-normal.woff`)

async function read(): Promise<{ text: Typeface; mono: Typeface }> {
  const signs = await bytesOf('app', 'fonts', 'signs.woff')
  const [text, mono] = [await faceFile('atkinson-hyperlegible-next'), await faceFile('atkinson-hyperlegible-mono')]
  return { text: typefaceOf([text, signs]), mono: typefaceOf([mono, signs]) }
}

let faces: ReturnType<typeof read> | undefined

/** The product's own faces, for pictures that carry their text as outlines. */
export function typefaces(): ReturnType<typeof read> {
  faces ??= read()
  return faces
}
