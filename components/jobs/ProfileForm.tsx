'use client'
import { useState } from 'react'
import { usePeople } from '@/components/people/data'
import { useMaterials } from '@/components/people/materials'
import { BothVersions } from '@/components/ui/BothVersions'
import { Button } from '@/components/ui/Button'
import { Field, Select } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { useCurrent } from '@/components/ui/useCurrent'
import { useForm } from '@/components/ui/useForm'
import { keys } from '@/lib/api/keys'
import type { Choice } from '@/lib/api/client'
import type { Profile } from '@/lib/api/schemas/profile'
import { addProfile, changeProfile, useJobs } from './data'
import { ALL_JOBS } from './lists'

const choice: Choice<Profile> = ({ Profile }) => Profile

const valuesOf = (profile: Profile) => ({
  jobId: profile.job.id,
  title: profile.title,
  materialId: profile.material?.id ?? '',
  ownerId: profile.owner.id,
  drawingNumber: profile.drawingNumber,
})

/** Adds a profile to a job or, with `profile`, changes it. */
export function ProfileForm({
  profile,
  jobId = '',
  onDone,
}: {
  profile?: Profile
  jobId?: string
  onDone: (profile: Profile) => void
}) {
  const jobs = useJobs(keys.jobs(ALL_JOBS)).data?.items ?? []
  const materials = useMaterials().data ?? []
  const people = usePeople().data ?? []
  const [seen, setSeen] = useState(profile)
  const { form, values, set, text, submit, busy, problem, setProblem } = useForm(
    profile ? valuesOf(profile) : { jobId, title: '', materialId: '', ownerId: '', drawingNumber: '' },
  )
  const stale = useCurrent(problem, choice)
  const take = (theirs: Profile, change: boolean) => {
    setSeen(theirs)
    setProblem(null)
    if (change) set(valuesOf(theirs))
  }
  const save = submit(async ({ ownerId, materialId, ...rest }) => {
    const fields = { ...rest, materialId: materialId || null, ...(ownerId ? { ownerId } : {}) }
    onDone(seen ? await changeProfile(seen, fields) : await addProfile(fields))
  })
  const nameOf = (list: readonly { id: string; name: string }[], id: string) => list.find((row) => row.id === id)?.name ?? ''
  return (
    <form ref={form} className="grid gap-4" onSubmit={save}>
      <Field {...text('title')} label="Title" required maxLength={160} hint="For example: Mullion 60 × 118, drained" autoFocus />
      <Select {...text('jobId')} label="Job" required>
        <option value="">Choose a job</option>
        {values.jobId && !jobs.some(({ id }) => id === values.jobId) && (
          <option value={values.jobId}>{profile?.job.id === values.jobId ? profile.job.number : 'This job'}</option>
        )}
        {jobs.map((job) => (
          <option key={job.id} value={job.id}>
            {job.number} {job.title}
          </option>
        ))}
      </Select>
      <Select {...text('materialId')} label="Material" hint="Gives the mass per metre. It can be chosen later.">
        <option value="">Not chosen yet</option>
        {materials.map((material) => (
          <option key={material.id} value={material.id}>
            {material.name} ({material.density} kg/m³)
          </option>
        ))}
      </Select>
      <Field {...text('drawingNumber')} label="Drawing number" maxLength={80} hint="As it stands in the drawing’s title block." />
      <Select {...text('ownerId')} label="Owner">
        {!profile && <option value="">Me</option>}
        {people
          .filter(({ disabled, id }) => !disabled || id === values.ownerId)
          .map((person) => (
            <option key={person.id} value={person.id}>
              {person.name}
            </option>
          ))}
      </Select>
      {stale ? (
        <BothVersions
          differences={[
            { name: 'Title', mine: values.title, theirs: stale.title },
            { name: 'Material', mine: nameOf(materials, values.materialId), theirs: stale.material?.name ?? '' },
            { name: 'Drawing number', mine: values.drawingNumber, theirs: stale.drawingNumber },
            { name: 'Owner', mine: nameOf(people, values.ownerId), theirs: stale.owner.name },
          ]}
          onMine={() => take(stale, false)}
          onTheirs={() => take(stale, true)}
        />
      ) : (
        <ProblemNotice problem={problem} />
      )}
      <div>
        <Button type="submit" look="main" disabled={busy}>
          {profile ? 'Save' : 'Add profile'}
        </Button>
      </div>
    </form>
  )
}
