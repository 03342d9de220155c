import { parseArgs } from 'node:util'

export interface CliArguments {
  file: string
  recipe?: string
  unit?: string
  scale?: string
  tolerance?: string
  makeUp?: string
  json: boolean
  help: boolean
}

export const USAGE = `usage: npm run -s section -- FILE.dxf [options]

Computes the section of a DXF drawing and prints it as a table.

  --recipe FILE     a recipe as JSON; the options below replace what it says
  --unit UNIT       mm, cm, m, in, ft or a number of mm per drawing unit
                    (default: the unit that the file declares, else mm)
  --scale N         the drawing's scale: mm per drawing unit = unit × N
  --tolerance MM    ends closer than this are joined (default 0.01)
  --make-up FILE    a list of { at, does } as JSON (default: by nesting depth)
  --json            print the answer as JSON
  --help            print this

Exit status 0 with a section, 2 where the drawing gives none or an argument is wrong.`

export function readArguments(argv: string[]): CliArguments {
  const { values, positionals } = parseArgs({
    args: argv,
    allowPositionals: true,
    options: {
      recipe: { type: 'string' },
      unit: { type: 'string' },
      scale: { type: 'string' },
      tolerance: { type: 'string' },
      'make-up': { type: 'string' },
      json: { type: 'boolean', default: false },
      help: { type: 'boolean', default: false },
    },
  })
  const { recipe, unit, scale, tolerance, json, help } = values
  if (!help && positionals.length !== 1) {
    throw new Error(positionals.length === 0 ? 'Name the DXF file.' : `Name one file, not ${positionals.length}.`)
  }
  return { file: positionals[0] ?? '', recipe, unit, scale, tolerance, makeUp: values['make-up'], json, help }
}
