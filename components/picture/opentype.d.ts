/** The part of opentype.js that is used here; the package brings no types. */
declare module 'opentype.js' {
  export type PathCommand =
    | { type: 'M' | 'L'; x: number; y: number }
    | { type: 'Q'; x1: number; y1: number; x: number; y: number }
    | { type: 'C'; x1: number; y1: number; x2: number; y2: number; x: number; y: number }
    | { type: 'Z' }
  export interface Font {
    charToGlyphIndex(character: string): number
    getAdvanceWidth(text: string, size: number): number
    getPath(text: string, x: number, y: number, size: number): { commands: PathCommand[] }
  }
  export function parse(bytes: ArrayBuffer): Font
}
