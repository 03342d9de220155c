import { Button } from './Button'
import { Notice } from './Notice'

export interface Difference {
  name: string
  mine: string
  theirs: string
}

/** Somebody changed the row meanwhile: both versions side by side, and which one stays. */
export function BothVersions({
  differences,
  onMine,
  onTheirs,
}: {
  differences: Difference[]
  onMine: () => void
  onTheirs: () => void
}) {
  return (
    <Notice tone="warning" live>
      <p>
        <b>Somebody changed this since you opened it.</b> Nothing is lost: choose what stays.
      </p>
      <table className="my-2 w-full text-left text-small">
        <thead>
          <tr className="text-soft">
            <th scope="col">Field</th>
            <th scope="col">Yours</th>
            <th scope="col">Theirs</th>
          </tr>
        </thead>
        <tbody>
          {differences.map(({ name, mine, theirs }) => (
            <tr key={name} className="border-t border-line">
              <th scope="row" className="py-1 font-normal text-soft">
                {name}
              </th>
              <td className={mine === theirs ? '' : 'font-semibold'}>{mine || '–'}</td>
              <td className={mine === theirs ? '' : 'font-semibold'}>{theirs || '–'}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="flex flex-wrap gap-2">
        <Button onClick={onMine}>Keep mine</Button>
        <Button onClick={onTheirs}>Take theirs</Button>
      </div>
    </Notice>
  )
}
