import type { Target } from '../target'
import { type Choices, isConfirmed } from './flow'

/** What still stands between this drawing and a saved revision, in words that follow "Once"; `ready`: the figures belong to the recipe. */
export function missingOf(choices: Choices, target: Target, ready: boolean): string[] {
  const missing: string[] = []
  if (!ready) missing.push('the drawing gives a section')
  if (choices.claim === null) missing.push('a known dimension is confirmed')
  if (choices.finished === null) missing.push('it is said what is drawn')
  if (ready && choices.claim !== null && choices.finished !== null && !isConfirmed(choices)) {
    missing.push('the known dimension agrees')
  }
  if (target.kind === 'new' && target.title.trim() === '') missing.push('the profile has a title')
  return missing
}
