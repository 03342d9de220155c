// Prints how long the source files are: median, 90th percentile, longest.
import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'

if (process.argv.includes('--help')) {
  console.log(`usage: npm run -s sizes

Prints the lengths of the source files in lines. Fails where one is over 400.`)
  process.exit(0)
}

const root = path.resolve(import.meta.dirname, '..')
const LIMIT = 400

const files = ['app', 'components', 'db', 'lib', 'scripts'].flatMap((folder) =>
  readdirSync(path.join(root, folder), { recursive: true })
    .filter((name) => /\.(ts|tsx|mjs)$/.test(name))
    .map((name) => path.join(folder, name)),
)
const sized = files
  .map((file) => ({ file, lines: readFileSync(path.join(root, file), 'utf8').split('\n').length - 1 }))
  .sort((a, b) => a.lines - b.lines)
const quantile = (q) => sized[Math.min(sized.length - 1, Math.floor(q * sized.length))].lines
const long = sized.filter(({ lines }) => lines > LIMIT)

console.log(`${sized.length} files, lines: median ${quantile(0.5)}, 90 % within ${quantile(0.9)}, longest ${quantile(1)}`)
for (const { file, lines } of sized.slice(-5).reverse()) console.log(`${String(lines).padStart(5)}  ${file}`)
if (long.length > 0) {
  console.error(`Over ${LIMIT} lines: ${long.map(({ file }) => file).join(', ')}`)
  process.exit(1)
}
