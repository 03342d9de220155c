import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { SetUpForm } from '@/components/setup/SetUpForm'
import { Door } from '@/components/shell/Door'
import { database } from '@/db/instance'
import { isSetUp } from '@/db/teams'
import { isCodeAsked } from '@/lib/auth/setupCode'

export const metadata: Metadata = { title: 'Set up' }

export default async function SetUpPage() {
  if (await isSetUp(database().read)) redirect('/sign-in')
  return (
    <Door
      title="Set up Sectionwright"
      lead="From a drawing to a section people may rely on. First, the team and its administrator."
    >
      <SetUpForm codeAsked={isCodeAsked()} />
    </Door>
  )
}
