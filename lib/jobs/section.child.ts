import { readFileSync } from 'node:fs'
import { packRegion } from '../geometry/pack'
import { askOthers } from '../opinions/askOthers'
import { withFindings } from './answer'
import { taskFinding } from './findings'
import type { SectionJob } from './sectionJob'
import { serveJobs, type Work } from './serveJobs'
import { readTask, sectionTask } from './tasks'
import { warmUp } from './warmUp'

const work: Work = ({ path, source, recipe, materials, unconfirmedBy }: SectionJob) => {
  let bytes: Uint8Array
  try {
    bytes = readFileSync(path)
  } catch (error) {
    return { unreadable: String(error) }
  }
  const drawing = readTask(bytes)
  const { answer, region, combination } = sectionTask(drawing, source, recipe, materials)
  const unconfirmed = unconfirmedBy ? [taskFinding('unit-unconfirmed', { by: unconfirmedBy, unit: recipe.unit })] : []
  return {
    answer: { answer: withFindings(answer, unconfirmed), region: region && packRegion(region) },
    opinions() {
      // nothing is saved without a section, so nobody would read them while others wait
      if (!answer.section) return { opinions: [], findings: [] }
      const opinions = askOthers(bytes, drawing, combination)
      const findings = opinions
        .filter(({ agrees }) => agrees === false)
        .map(({ library, sentence }) => taskFinding('opinion-disagrees', { library, sentence }))
      return { opinions, findings }
    },
  }
}

serveJobs(work, new URL('./watchdog.mjs', import.meta.url))
warmUp()
