import { type Font, type PathCommand, parse } from 'opentype.js'

/** Text as outlines: the same on every machine, and nothing in it can be read as markup. */
export interface Typeface {
  /** px */
  width: (text: string, size: number) => number
  /** SVG path of the text with its baseline at x, y */
  path: (text: string, x: number, y: number, size: number) => string
}

interface Run {
  font: Font
  text: string
}

const round = (value: number) => String(Math.round(value * 100) / 100)

/** The package's own writer gives exponents in places, which not every reader takes. */
function written(command: PathCommand): string {
  switch (command.type) {
    case 'Z':
      return 'Z'
    case 'Q':
      return `Q${[command.x1, command.y1, command.x, command.y].map(round).join(' ')}`
    case 'C':
      return `C${[command.x1, command.y1, command.x2, command.y2, command.x, command.y].map(round).join(' ')}`
    default:
      return `${command.type}${round(command.x)} ${round(command.y)}`
  }
}

/** Cuts a text into runs of one font each; a character that no font has shows the first font's empty box. */
function runsOf(fonts: Font[], text: string): Run[] {
  const runs: Run[] = []
  for (const character of text) {
    const font = fonts.find((candidate) => candidate.charToGlyphIndex(character) > 0) ?? fonts[0]
    const last = runs.at(-1)
    if (last?.font === font) last.text += character
    else runs.push({ font, text: character })
  }
  return runs
}

/** A typeface from static font files (WOFF or TTF, not WOFF2), the first that has a character draws it. */
export function typefaceOf(files: ArrayBuffer[]): Typeface {
  const fonts = files.map((bytes) => parse(bytes))
  const width = (text: string, size: number) =>
    runsOf(fonts, text).reduce((sum, run) => sum + run.font.getAdvanceWidth(run.text, size), 0)
  return {
    width,
    path(text, x, y, size) {
      let at = x
      let data = ''
      for (const run of runsOf(fonts, text)) {
        data += run.font.getPath(run.text, at, y, size).commands.map(written).join('')
        at += run.font.getAdvanceWidth(run.text, size)
      }
      return data
    },
  }
}
