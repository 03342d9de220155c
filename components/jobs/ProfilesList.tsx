'use client'
import { ExportMenu } from '@/components/lists/ExportMenu'
import { ListBar } from '@/components/lists/ListBar'
import type { ListDefaults } from '@/components/lists/listPath'
import { Pager } from '@/components/lists/Pager'
import { useListQuery } from '@/components/lists/useListQuery'
import { usePeople } from '@/components/people/data'
import { useMaterials } from '@/components/people/materials'
import { useMay } from '@/components/shell/Me'
import { LinkButton } from '@/components/ui/Button'
import { Empty } from '@/components/ui/Empty'
import { Select } from '@/components/ui/Field'
import { ProblemNotice } from '@/components/ui/ProblemNotice'
import { problemOf } from '@/components/ui/problem'
import { allProfiles, PROFILES, useProfiles } from './data'
import { ProfilesTable, useProfileColumns } from './ProfilesTable'

/** The team's profiles or, with `jobId`, those of one job. */
export function ProfilesList({ defaults, jobId, name }: { defaults: ListDefaults; jobId?: string; name: string }) {
  const list = useListQuery(PROFILES, defaults)
  const { data, error, isLoading } = useProfiles(list.path)
  const columns = useProfileColumns({ ofJob: jobId !== undefined })
  const materials = useMaterials().data ?? []
  const people = usePeople().data ?? []
  const choose = (filter: 'materialId' | 'ownerId') => ({
    value: list.asking.get(filter) ?? '',
    onChange: (event: { target: { value: string } }) => list.change({ [filter]: event.target.value, cursor: null }),
  })
  return (
    <>
      <ListBar label="Filter profiles" placeholder="Number, title, or Ix ≥ 40 cm⁴" {...list}>
        {jobId === undefined && (
          <>
            <Select label="Material" quietLabel {...choose('materialId')}>
              <option value="">Every material</option>
              {materials.map(({ id, name: material }) => (
                <option key={id} value={id}>
                  {material}
                </option>
              ))}
            </Select>
            <Select label="Owner" quietLabel {...choose('ownerId')}>
              <option value="">Every owner</option>
              {people.map(({ id, name: person }) => (
                <option key={id} value={id}>
                  {person}
                </option>
              ))}
            </Select>
          </>
        )}
        <ExportMenu name={name} columns={columns} all={() => allProfiles(list.asking)} />
      </ListBar>
      {error && !data && <ProblemNotice problem={problemOf(error)} />}
      {data && data.items.length > 0 && (
        <>
          <ProfilesTable profiles={data.items} columns={columns} sorting={list.sorting} busy={isLoading} />
          <Pager
            shown={data.items.length}
            total={data.total}
            noun={data.total === 1 ? 'profile' : 'profiles'}
            onFirst={list.paged ? () => list.toPage(null) : null}
            onNext={data.next ? () => list.toPage(data.next) : null}
          />
        </>
      )}
      {data?.items.length === 0 && <NoProfiles asked={list.asked} bin={list.bin} jobId={jobId} />}
    </>
  )
}

function NoProfiles({ asked, bin, jobId }: { asked: string; bin: boolean; jobId?: string }) {
  const mayAdd = useMay('profile.edit')
  if (bin) return <Empty title="The bin is empty">What is deleted waits here and can be restored.</Empty>
  if (asked) {
    return (
      <Empty title={`No profile matches “${asked}”`}>
        Look for a number, words of the title, or figures:{' '}
        <code className="font-mono">ix&gt;=40cm4 mass&lt;=2.1 circle&lt;=140</code>
      </Empty>
    )
  }
  return (
    <Empty
      title="No profiles yet"
      action={
        mayAdd && (
          <>
            <LinkButton href={jobId ? `/profiles/new?job=${jobId}` : '/profiles/new'} look="main">
              Add the first profile
            </LinkButton>
            {jobId && <LinkButton href={`/jobs/${jobId}/upload`}>Drop drawings</LinkButton>}
          </>
        )
      }
    >
      A profile is one part with a constant cross-section. It gets its figures from the drawing that you drop on it.
    </Empty>
  )
}
