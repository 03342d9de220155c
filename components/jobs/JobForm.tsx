'use client'
import { useState } from 'react'
import { BothVersions } from '@/components/ui/BothVersions'
import { Button } from '@/components/ui/Button'
import { Field } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useCurrent } from '@/components/ui/useCurrent'
import { useForm } from '@/components/ui/useForm'
import type { Choice } from '@/lib/api/client'
import type { Job } from '@/lib/api/schemas/job'
import { changeJob, openJob } from './data'

const choice: Choice<Job> = ({ Job }) => Job

/** Opens a job or, with `job`, changes it. */
export function JobForm({ job, onDone }: { job?: Job; onDone: (job: Job) => void }) {
  const [seen, setSeen] = useState(job)
  const { form, values, set, text, submit, busy, problem, setProblem } = useForm({
    title: job?.title ?? '',
    client: job?.client ?? '',
  })
  const stale = useCurrent(problem, choice)
  const take = (theirs: Job, change: boolean) => {
    setSeen(theirs)
    setProblem(null)
    if (change) set({ title: theirs.title, client: theirs.client })
  }
  return (
    <form
      ref={form}
      className="grid gap-4"
      onSubmit={submit(async (v) => onDone(seen ? await changeJob(seen, v) : await openJob(v)))}
    >
      <Field
        {...text('title')}
        label="Title"
        required
        maxLength={160}
        hint="The order or building, as people call it."
        autoFocus
      />
      <Field {...text('client')} label="Client" maxLength={160} />
      {stale ? (
        <BothVersions
          differences={[
            { name: 'Title', mine: values.title, theirs: stale.title },
            { name: 'Client', mine: values.client, theirs: stale.client },
          ]}
          onMine={() => take(stale, false)}
          onTheirs={() => take(stale, true)}
        />
      ) : (
        <ProblemNotice problem={problem} />
      )}
      <div>
        <Button type="submit" look="main" disabled={busy} shortcut="Enter">
          {job ? 'Save' : 'Open job'}
        </Button>
      </div>
    </form>
  )
}
