import { LinkButton } from '@/components/ui/Button'
import { Empty } from '@/components/ui/Empty'
import { ERRORS } from '@/lib/api/errors'

export default function NotFound() {
  return (
    <div className="py-6">
      <h1 className="sr-only">Nothing here</h1>
      <Empty title="Nothing here" action={<LinkButton href="/profiles">To the profiles</LinkButton>}>
        {ERRORS.not_found.title}
      </Empty>
    </div>
  )
}
