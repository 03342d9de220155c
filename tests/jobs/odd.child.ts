import { serveJobs, type Work } from '@/lib/jobs/serveJobs'

/** A child that misbehaves as the job's name says; the same watchdog as the real one. */
const work: Work = ({ source, recipe }) => {
  const hold: unknown[] = []
  switch (source.name) {
    case 'loop':
      for (;;) Math.sqrt(2)
    case 'heap':
      for (;;) hold.push(new Array(1000).fill({ held: hold.length }))
    case 'buffers':
      for (;;) hold.push(new Uint8Array(16 * 1024 ** 2).fill(1))
    case 'exit':
      return process.exit(3)
    case 'missing':
      return { unreadable: 'there is no such file' }
  }
  const until = Date.now() + source.bytes
  while (Date.now() < until) Math.sqrt(2)
  const answer = {
    engineVersion: String(process.pid),
    source,
    recipe,
    unit: { drawing: 'mm', mmPerUnit: 1, declared: 'none' },
    outlines: [],
    outlinesTotal: 0,
    findings: [],
    findingsTotal: 0,
    section: null,
  }
  return {
    answer: { answer, region: null },
    opinions() {
      if (source.name === 'slow opinions') for (;;) Math.sqrt(2)
      return { opinions: [{ library: 'other', agrees: true, sentence: 'Agrees.' }], findings: [] }
    },
  }
}

serveJobs(work, new URL('./watchdog.mjs', import.meta.url))
