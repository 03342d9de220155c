'use client'
import Link from 'next/link'
import { useEffect, useRef } from 'react'
import { Button, LinkButton } from '@/components/ui/Button'
import { Notice } from '@/components/ui/Notice'
import type { Revision } from '@/lib/api/schemas/revision'

/** What has been saved, and where to go from here. */
export function Saved({
  revision,
  number,
  further,
  onFurther,
}: {
  revision: Revision
  number: string
  /** details of the sheet that no profile was made of yet */
  further: number
  onFurther: () => void
}) {
  const { alsoIn } = revision.file
  const place = useRef<HTMLDivElement>(null)
  useEffect(() => {
    place.current?.focus()
  }, [])
  return (
    <div ref={place} tabIndex={-1} className="border-hair border-t pt-2 outline-none">
      <Notice tone="good" live>
        <p>
          <b>
            Revision {revision.letter} of {number} is saved
          </b>{' '}
          with its drawing, byte for byte.
        </p>
        {alsoIn.length > 0 && (
          <p className="text-small">
            The same file is also in{' '}
            {alsoIn.map(({ profileId, number: other, letter }) => (
              <Link key={`${profileId} ${letter}`} href={`/profiles/${profileId}`} className="mr-2 text-accent underline">
                {other} {letter}
              </Link>
            ))}
          </p>
        )}
        <div className="mt-2 flex flex-wrap gap-2">
          <LinkButton href={`/profiles/${revision.profileId}`} look="main">
            Open the section sheet
          </LinkButton>
          {further > 0 && (
            <Button onClick={onFurther}>
              Another profile from this sheet ({further} {further === 1 ? 'detail' : 'details'} left)
            </Button>
          )}
        </div>
      </Notice>
    </div>
  )
}
