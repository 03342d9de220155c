'use client'
import dynamic from 'next/dynamic'
import Link from 'next/link'
import { useState } from 'react'
import { useMaterials } from '@/components/people/materials'
import { PageHead } from '@/components/shell/PageHead'
import type { Profile } from '@/lib/api/schemas/profile'
import type { UploadFlow as Flow } from './UploadFlow'

const waiting = () => <div className="min-h-72 border border-hair bg-sheet" />
const DropZone = dynamic(() => import('./DropZone').then((module) => module.DropZone), { ssr: false, loading: waiting })
const UploadFlow = dynamic<React.ComponentProps<typeof Flow>>(() => import('./UploadFlow').then((module) => module.UploadFlow), {
  ssr: false,
  loading: waiting,
})

/** A drawing for one profile. */
export function UploadPage({ profile }: { profile: Profile }) {
  const [file, setFile] = useState<File | null>(null)
  const materials = useMaterials().data
  return (
    <>
      <PageHead
        number={profile.number}
        title={profile.title}
        beside={
          <span className="text-soft">
            {profile.latest ? `Revision ${profile.latest.letter} so far` : 'No revision yet'} · Job{' '}
            <Link href={`/jobs/${profile.job.id}`} className="hover:underline">
              {profile.job.number} {profile.job.title}
            </Link>
          </span>
        }
      />
      {file && materials ? (
        <UploadFlow
          key={`${file.name} ${file.size} ${file.lastModified}`}
          file={file}
          first={{ kind: 'profile', profile }}
          materials={materials}
          onOther={() => setFile(null)}
        />
      ) : (
        <DropZone onFiles={([first]) => setFile(first)} />
      )}
    </>
  )
}
