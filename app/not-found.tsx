import { Door } from '@/components/shell/Door'
import { LinkButton } from '@/components/ui/Button'
import { ERRORS } from '@/lib/api/errors'

export default function NotFound() {
  return (
    <Door title="Nothing here" lead={ERRORS.not_found.title}>
      <LinkButton href="/" look="main">
        To the first page
      </LinkButton>
    </Door>
  )
}
