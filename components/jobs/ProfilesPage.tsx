'use client'
import { useMay } from '@/components/shell/Me'
import { PageHead } from '@/components/shell/PageHead'
import { LinkButton } from '@/components/ui/Button'
import { PROFILE_LIST } from './lists'
import { ProfilesList } from './ProfilesList'

export function ProfilesPage() {
  const mayAdd = useMay('profile.edit')
  return (
    <>
      <PageHead
        title="Profiles"
        actions={
          mayAdd && (
            <LinkButton href="/profiles/new" look="main">
              New profile
            </LinkButton>
          )
        }
      />
      <ProfilesList defaults={PROFILE_LIST} name="profiles" />
    </>
  )
}
