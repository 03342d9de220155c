// Scripts and styles never change under their name: packed once after the build, as small as they get, and sent as they are.
import { createReadStream, existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { brotliCompressSync } from 'node:zlib'

const URL_PREFIX = '/_next/static/'
const TYPES = { '.js': 'application/javascript; charset=UTF-8', '.css': 'text/css; charset=UTF-8' }

const folderOf = (dist) => path.join(dist, 'static')
function namesIn(dist, ending) {
  const folder = folderOf(dist)
  if (!existsSync(folder)) return []
  return readdirSync(folder, { recursive: true })
    .map((name) => name.split(path.sep).join('/'))
    .filter((name) => ending.test(name))
}

/** Puts a packed copy beside every script and style of a build. */
export function pack(dist) {
  for (const name of namesIn(dist, /\.(js|css)$/)) {
    const file = path.join(folderOf(dist), name)
    writeFileSync(`${file}.br`, brotliCompressSync(readFileSync(file)))
  }
}

/** Answers what asks for a packed file, and says whether it did; everything else is Next's. */
export function packedFiles(dist) {
  const packed = new Set(namesIn(dist, /\.br$/))
  return (request, response) => {
    if (request.method !== 'GET' || !request.url.startsWith(URL_PREFIX)) return false
    if (!/\bbr\b/.test(request.headers['accept-encoding'] ?? '')) return false
    const name = request.url.slice(URL_PREFIX.length).split('?')[0]
    if (!packed.has(`${name}.br`)) return false
    response.writeHead(200, {
      'content-type': TYPES[path.extname(name)],
      'content-encoding': 'br',
      vary: 'Accept-Encoding',
      'cache-control': 'public, max-age=31536000, immutable',
      'x-content-type-options': 'nosniff',
    })
    createReadStream(path.join(folderOf(dist), `${name}.br`))
      .on('error', () => response.destroy())
      .pipe(response)
    return true
  }
}
