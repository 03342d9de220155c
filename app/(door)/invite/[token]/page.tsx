import type { Metadata } from 'next'
import { AcceptForm } from '@/components/setup/AcceptForm'
import { Door } from '@/components/shell/Door'
import { LinkButton } from '@/components/ui/Button'
import { database } from '@/db/instance'
import { lookUpInvitation } from '@/db/invitations'
import { ERRORS, isAppError } from '@/lib/api/errors'

export const metadata: Metadata = { title: 'Join a team', referrer: 'no-referrer' }

async function invitationOf(token: string) {
  try {
    return await lookUpInvitation(database().read, token)
  } catch (error) {
    if (isAppError(error)) return null
    throw error
  }
}

export default async function InvitePage({ params }: PageProps<'/invite/[token]'>) {
  const { token } = await params
  const invitation = await invitationOf(token)
  if (!invitation) {
    return (
      <Door title="This link does not open" lead={ERRORS.link_spent.title}>
        <LinkButton href="/sign-in">Sign in</LinkButton>
      </Door>
    )
  }
  return (
    <Door title={`Join ${invitation.team}`} lead={`As ${invitation.roles.join(', ')}.`}>
      <AcceptForm token={token} email={invitation.email} known={invitation.known} />
    </Door>
  )
}
