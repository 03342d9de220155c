'use client'
import Link from 'next/link'
import { lazy, useState } from 'react'
import { ExportMenu } from '@/components/lists/ExportMenu'
import { ListBar } from '@/components/lists/ListBar'

import { Pager } from '@/components/lists/Pager'
import { useListQuery } from '@/components/lists/useListQuery'
import { useMay, useMe } from '@/components/shell/Me'
import { PageHead } from '@/components/shell/PageHead'
import { LinkButton } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { formatDate } from '@/components/ui/dates'
import { Empty } from '@/components/ui/Empty'
import { Menu } from '@/components/ui/Menu'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { problemOf } from '@/components/ui/problem'
import { type Column, Table } from '@/components/ui/Table'
import type { Job } from '@/lib/api/schemas/job'
import { allJobs, JOBS, useJobs } from './data'
import { JOB_LIST } from './lists'
import { useBinning } from './useBinning'

const JobForm = lazy(() => import('./JobForm').then((module) => ({ default: module.JobForm })))

export function JobsList() {
  const list = useListQuery(JOBS, JOB_LIST)
  const { data, error, isLoading } = useJobs(list.path)
  const [renamed, setRenamed] = useState<Job | null>(null)
  const { zone } = useMe()
  const mayEdit = useMay('job.edit')
  const { binJob, restoreJob } = useBinning()

  const columns: Column<Job>[] = [
    {
      key: 'number',
      head: 'Number',
      sort: 'number',
      plain: (job) => job.number,
      cell: (job) => (
        <Link href={`/jobs/${job.id}`} className="whitespace-nowrap font-mono text-accent hover:underline">
          {job.number}
        </Link>
      ),
    },
    {
      key: 'title',
      head: 'Title',
      sort: 'title',
      plain: (job) => job.title,
      cell: (job) => <Link href={`/jobs/${job.id}`}>{job.title}</Link>,
    },
    { key: 'client', head: 'Client', plain: (job) => job.client, cell: (job) => job.client, wide: true },
    { key: 'profiles', head: 'Profiles', figure: true, plain: (job) => job.profiles, cell: (job) => job.profiles },
    {
      key: 'updatedAt',
      head: 'Changed',
      sort: 'updatedAt',
      wide: true,
      plain: (job) => job.updatedAt,
      cell: (job) => formatDate(job.updatedAt, zone),
    },
  ]
  if (mayEdit) {
    columns.push({
      key: 'do',
      head: <span className="sr-only">Actions</span>,
      cell: (job) => (
        <Menu
          label="⋯"
          name={`Actions for ${job.number}`}
          className="flex justify-end"
          items={
            job.binnedAt
              ? [{ label: 'Restore', onChoose: () => restoreJob(job) }]
              : [
                  { label: 'Rename …', onChoose: () => setRenamed(job) },
                  { label: 'Move to bin', danger: true, onChoose: () => binJob(job) },
                ]
          }
        />
      ),
    })
  }

  return (
    <>
      <PageHead
        title="Jobs"
        actions={
          mayEdit && (
            <LinkButton href="/jobs/new" look="main">
              New job
            </LinkButton>
          )
        }
      />
      <ListBar label="Filter jobs" placeholder="Number, title or client" {...list}>
        <ExportMenu name="jobs" columns={columns} all={() => allJobs(list.asking)} />
      </ListBar>
      {error && !data && <ProblemNotice problem={problemOf(error)} />}
      {data && data.items.length > 0 && (
        <>
          <Table
            caption="Jobs"
            columns={columns}
            rows={data.items}
            rowKey={(job) => job.id}
            sorting={list.sorting}
            busy={isLoading}
          />
          <Pager
            shown={data.items.length}
            total={data.total}
            noun={data.total === 1 ? 'job' : 'jobs'}
            onFirst={list.paged ? () => list.toPage(null) : null}
            onNext={data.next ? () => list.toPage(data.next) : null}
          />
        </>
      )}
      {data?.items.length === 0 && <NoJobs asked={list.asked} bin={list.bin} mayEdit={mayEdit} />}
      <Dialog title={`Rename ${renamed?.number ?? ''}`} open={renamed !== null} onClose={() => setRenamed(null)}>
        {renamed && <JobForm job={renamed} onDone={() => setRenamed(null)} />}
      </Dialog>
    </>
  )
}

function NoJobs({ asked, bin, mayEdit }: { asked: string; bin: boolean; mayEdit: boolean }) {
  if (bin) return <Empty title="The bin is empty">What is deleted waits here and can be restored.</Empty>
  if (asked) return <Empty title={`No job matches “${asked}”`}>Look for a number, or words of the title or the client.</Empty>
  return (
    <Empty
      title="No jobs yet"
      action={
        mayEdit && (
          <LinkButton href="/jobs/new" look="main">
            Open the first job
          </LinkButton>
        )
      }
    >
      A job is a client’s order or a project; it holds the profiles that are drawn for it.
    </Empty>
  )
}
