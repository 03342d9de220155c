import { newIdempotencyKey, sendJson } from '@/lib/api/client'
import { keys } from '@/lib/api/keys'
import type { RevisionFields } from '@/lib/api/schemas/revision'
import type { Recipe } from '@/lib/geometry/recipe'
import { FIGURES } from '@/lib/section/figures'
import type { Section } from '@/lib/section/types'
import { type Choices, type FlowState, isConfirmed } from './flow/flow'
import { compare } from './flow/size'

/** The figures as the browser showed them: the server refuses to save where its own differ. */
export const shownFigures = (section: Section): Record<string, number | null> =>
  Object.fromEntries(FIGURES.map(({ key, value }) => [key, value(section) ?? null]))

export function revisionFields(state: FlowState, choices: Choices, section: Section): RevisionFields {
  const { claim, finished, recipe } = choices
  const { drawingRevision, note } = state
  const confirmation =
    claim && finished && isConfirmed(choices)
      ? { by: claim.by, what: claim.what, value: claim.value, measured: compare(claim, recipe).measured, finished }
      : null
  return { drawingRevision, note, confirmation, shown: shownFigures(section) }
}

export interface Upload {
  profileId: string
  /** the bytes, or the hash of a file that the team has already */
  file: File
  sha256: string | null
  recipe: Recipe
  fields: RevisionFields
}

/** One key for one upload: a retry of the same thing gets the first one's result, a change gets a key of its own. */
export function uploader() {
  let last = { of: '', key: '' }
  return async ({ profileId, file, sha256, recipe, fields }: Upload, signal: AbortSignal) => {
    const of = JSON.stringify([profileId, file.name, file.size, file.lastModified, recipe, fields])
    if (of !== last.of) last = { of, key: newIdempotencyKey() }
    const body = new FormData()
    body.set('recipe', JSON.stringify(recipe))
    body.set('fields', JSON.stringify(fields))
    if (sha256) {
      body.set('fileSha256', sha256)
      body.set('fileName', file.name)
    } else body.set('file', file)
    const { revision } = await sendJson('POST', keys.revisions(profileId), ({ Saved }) => Saved, {
      body,
      idempotencyKey: last.key,
      signal,
    })
    return revision
  }
}
