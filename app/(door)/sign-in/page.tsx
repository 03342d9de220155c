import type { Metadata } from 'next'
import { redirect } from 'next/navigation'
import { SignInForm } from '@/components/setup/SignInForm'
import { Door } from '@/components/shell/Door'
import { database } from '@/db/instance'
import { isSetUp } from '@/db/teams'

export const metadata: Metadata = { title: 'Sign in' }

/** Only a path of this app is followed after signing in. */
const safePath = (to: string | string[] | undefined) =>
  typeof to === 'string' && /^\/(?![/\\])/.test(to) && !to.startsWith('/sign-in') ? to : '/'

export default async function SignInPage({ searchParams }: PageProps<'/sign-in'>) {
  if (!(await isSetUp(database().read))) redirect('/setup')
  return (
    <Door title="Sign in">
      <SignInForm to={safePath((await searchParams).to)} />
    </Door>
  )
}
