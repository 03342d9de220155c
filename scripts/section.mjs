// npm run -s section -- FILE.dxf …: builds the command line tool where a source has changed, then runs it.
import path from 'node:path'
import { pathToFileURL } from 'node:url'
import { ensureBuilt } from './build-worker.mjs'

await ensureBuilt(['section.cli'])
await import(pathToFileURL(path.resolve(import.meta.dirname, '..', 'dist-worker', 'section.cli.mjs')).href)
