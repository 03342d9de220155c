import { classes } from './classes'

const TONES: Record<string, string> = {
  draft: 'text-soft',
  'in review': 'text-accent',
  released: 'text-moss',
  superseded: 'text-ochre',
  withdrawn: 'text-brick',
}

/** The state of a revision, always as a word, with its letter before it. */
export function StateBadge({ state, letter }: { state: string; letter?: string }) {
  return (
    <span
      className={classes(
        'inline-block whitespace-nowrap rounded-[2px] border border-current px-2 text-small',
        TONES[state] ?? 'text-soft',
      )}
    >
      {letter ? `${letter} · ${state}` : state}
    </span>
  )
}
