import type { Finding } from '../geometry/finding'
import type { Recipe } from '../geometry/recipe'
import type { SectionAnswer } from '../section/types'
import type { Source, UsedMaterial } from './answer'
import type { Opinion } from '../opinions/opinion'

/** Work for the server's child process: a path in, so that no bytes travel between the processes. */
export interface SectionJob {
  path: string
  source: Source
  recipe: Recipe
  materials: Record<string, UsedMaterial>
  /** who named the unit where no person confirmed it ("the API"): a finding then says so */
  unconfirmedBy?: string
}

/** What the other libraries said, with a finding for each disagreement. */
export interface Opinions {
  opinions: Opinion[]
  findings: Finding[]
}

/** From parent to child. */
export interface JobRequest {
  id: number
  job: SectionJob
  /** wall time for the answer and then for the second opinions */
  seconds: number
  opinionSeconds: number
  /** resident memory of the whole child */
  memoryBytes: number
}

/** From child to parent: the section first, the second opinions after. `region` is packed (`packRegion`). */
export type JobReply =
  | { id: number; stage: 'answer'; answer: SectionAnswer; region: Uint8Array | null }
  | { id: number; stage: 'opinions'; opinions: Opinions }
  | { id: number; stage: 'unreadable'; message: string }

/**
 * Why a job gave no answer: over its time, over its memory, its process died, the caller gave up,
 * the file could not be opened, or the person already has as many jobs waiting as is fair (answer 429).
 */
export type JobFailure = 'time' | 'memory' | 'died' | 'aborted' | 'unreadable' | 'queue'

export type JobResult =
  | {
      ok: true
      answer: SectionAnswer
      region: Uint8Array | null
      /** settles later and never rejects; null where they took too long or their process died */
      opinions: Promise<Opinions | null>
    }
  | { ok: false; why: JobFailure }
