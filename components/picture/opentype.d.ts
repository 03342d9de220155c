/** The part of opentype.js that is used here; the package brings no types. */
declare module 'opentype.js' {
  export interface OutlinePath {
    toPathData(decimals: number): string
  }
  export interface Font {
    unitsPerEm: number
    charToGlyphIndex(character: string): number
    getAdvanceWidth(text: string, size: number, options?: { kerning: boolean }): number
    getPath(text: string, x: number, y: number, size: number, options?: { kerning: boolean }): OutlinePath
  }
  export function parse(bytes: ArrayBuffer): Font
}
