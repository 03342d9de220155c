import type { OriginKind } from '@/lib/section/types'

const WORDS: Record<OriginKind, string> = {
  exact: 'exact: closed form on every edge',
  iterated: 'iterated until rounding stops it',
  element: 'by finite elements, between bounds',
}
const SHAPES: Record<OriginKind, string> = {
  exact: 'bg-soft border-[1.5px]',
  iterated: 'rounded-full border-[1.5px]',
  element: 'border-x-[1.5px]',
}

/** How a figure was found: square exact, ring iterated, two bars by finite elements; with its word. */
export function OriginMark({ kind, estimate = false }: { kind: OriginKind; estimate?: boolean }) {
  const word = estimate ? 'an estimate by finite elements' : WORDS[kind]
  return <span role="img" aria-label={word} title={word} className={`inline-block size-2.5 border-soft ${SHAPES[kind]}`} />
}

export function OriginLegend() {
  const words: [OriginKind, string][] = [
    ['exact', 'exact'],
    ['iterated', 'iterated'],
    ['element', 'by finite elements'],
  ]
  return (
    <ul className="flex flex-wrap gap-x-5 text-tiny text-soft" aria-label="How figures were found">
      {words.map(([kind, word]) => (
        <li key={kind} className="flex items-center gap-1.5">
          <span aria-hidden="true" className={`inline-block size-2.5 border-soft ${SHAPES[kind]}`} />
          {word}
        </li>
      ))}
    </ul>
  )
}
