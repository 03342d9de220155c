'use client'
import { lazy, useState } from 'react'
import { useMay } from '@/components/shell/Me'
import { PageHead } from '@/components/shell/PageHead'
import { LinkButton } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { Menu } from '@/components/ui/Menu'
import { Notice } from '@/components/ui/Notice'
import { useJob } from './data'
import { jobProfiles } from './lists'
import { ProfilesList } from './ProfilesList'
import { useBinning } from './useBinning'

const JobForm = lazy(() => import('./JobForm').then((module) => ({ default: module.JobForm })))

export function JobPage({ id }: { id: string }) {
  const { data: job } = useJob(id)
  const [renaming, setRenaming] = useState(false)
  const mayEdit = useMay('job.edit')
  const mayAdd = useMay('profile.edit')
  const { binJob, restoreJob } = useBinning()
  if (!job) return null
  return (
    <>
      <PageHead
        number={job.number}
        title={job.title}
        beside={job.client && <span className="text-soft">{job.client}</span>}
        actions={
          !job.binnedAt && (
            <>
              {mayAdd && <LinkButton href={`/jobs/${id}/upload`}>Drop drawings</LinkButton>}
              {mayAdd && (
                <LinkButton href={`/profiles/new?job=${id}`} look="main">
                  New profile
                </LinkButton>
              )}
              {mayEdit && (
                <Menu
                  label="⋯"
                  name={`Actions for ${job.number}`}
                  items={[
                    { label: 'Rename …', onChoose: () => setRenaming(true) },
                    { label: 'Move to bin', danger: true, onChoose: () => binJob(job) },
                  ]}
                />
              )}
            </>
          )
        }
      />
      {job.binnedAt && (
        <Notice tone="warning">
          <b>This job is in the bin.</b>{' '}
          {mayEdit && (
            <button type="button" className="target text-accent underline" onClick={() => restoreJob(job)}>
              Restore it
            </button>
          )}
        </Notice>
      )}
      <ProfilesList defaults={jobProfiles(id)} jobId={id} name={`profiles-${job.number}`} />
      <Dialog title={`Rename ${job.number}`} open={renaming} onClose={() => setRenaming(false)}>
        {renaming && <JobForm job={job} onDone={() => setRenaming(false)} />}
      </Dialog>
    </>
  )
}
