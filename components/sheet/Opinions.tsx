import { Notice } from '@/components/ui/Notice'
import type { Opinion } from '@/lib/api/schemas/revision'

/** What other libraries say about the same file: one quiet line while they agree, loud where one does not. */
export function Opinions({ opinions }: { opinions: Opinion[] | null }) {
  if (opinions === null) return <p className="text-small text-soft">Second opinions are still being asked.</p>
  const against = opinions.filter(({ agrees }) => agrees === false)
  const agreeing = opinions.filter(({ agrees }) => agrees === true)
  return (
    <>
      {against.map(({ library, sentence }) => (
        <Notice key={library} tone="error">
          <b>A second opinion disagrees.</b> {sentence}
        </Notice>
      ))}
      {against.length === 0 && agreeing.length > 0 && (
        <details className="text-small text-soft">
          <summary className="inline">
            {agreeing.length === 1 ? 'A second opinion agrees.' : `${agreeing.length} second opinions agree.`}
          </summary>
          <ul>
            {opinions.map(({ library, sentence }) => (
              <li key={library}>{sentence}</li>
            ))}
          </ul>
        </details>
      )}
    </>
  )
}
