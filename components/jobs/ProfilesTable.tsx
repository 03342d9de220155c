'use client'
import Link from 'next/link'
import { lazy, useState } from 'react'
import { FigureText } from '@/components/lists/FigureText'
import { useMay, useMe } from '@/components/shell/Me'
import { Dialog } from '@/components/ui/Dialog'
import { Menu, type MenuItem } from '@/components/ui/Menu'
import { StateBadge } from '@/components/ui/StateBadge'
import { type Column, type Sorting, Table } from '@/components/ui/Table'
import type { Profile } from '@/lib/api/schemas/profile'
import { axisNames } from '@/lib/section/naming'
import type { Quantity } from '@/lib/units/quantity'
import { useBinning } from './useBinning'

const ProfileForm = lazy(() => import('./ProfileForm').then((module) => ({ default: module.ProfileForm })))

type Figures = NonNullable<Profile['latest']>['figures']

/** The figures of the list: the same that the API sorts by. */
const FIGURES: { key: keyof Figures; name: string; sub?: 'x' | 'y'; quantity: Quantity; unit: string; sort?: string }[] = [
  { key: 'area', name: 'A', quantity: 'area', unit: 'mm²', sort: 'area' },
  { key: 'mass', name: 'm', quantity: 'massPerLength', unit: 'kg/m', sort: 'mass' },
  { key: 'ix', name: 'I', sub: 'x', quantity: 'secondMoment', unit: 'mm⁴', sort: 'ix' },
  { key: 'iy', name: 'I', sub: 'y', quantity: 'secondMoment', unit: 'mm⁴', sort: 'iy' },
  { key: 'circle', name: 'Ø circle', quantity: 'length', unit: 'mm', sort: 'circle' },
]

/** All columns of a list of profiles, as table and export show them. */
export function useProfileColumns({ ofJob = false }: { ofJob?: boolean } = {}): Column<Profile>[] {
  const mayUpload = useMay('revision.add')
  // a profile without a revision waits for its drawing
  const hrefOf = ({ id, latest }: Profile) => (latest || !mayUpload ? `/profiles/${id}` : `/profiles/${id}/upload`)
  const names = axisNames(useMe().team.settings.axes)
  const columns: Column<Profile>[] = [
    {
      key: 'number',
      head: 'Number',
      sort: 'number',
      plain: (profile) => profile.number,
      cell: (profile) => (
        <Link href={hrefOf(profile)} className="whitespace-nowrap font-mono text-accent hover:underline">
          {profile.number}
        </Link>
      ),
    },
    {
      key: 'title',
      head: 'Title',
      sort: 'title',
      plain: (profile) => profile.title,
      cell: (profile) => <Link href={hrefOf(profile)}>{profile.title}</Link>,
    },
    {
      key: 'job',
      head: 'Job',
      wide: true,
      plain: (profile) => profile.job.number,
      cell: (profile) => (
        <Link href={`/jobs/${profile.job.id}`} title={profile.job.title} className="whitespace-nowrap font-mono">
          {profile.job.number}
        </Link>
      ),
    },
    {
      key: 'material',
      head: 'Material',
      wide: true,
      plain: (profile) => profile.material?.name ?? null,
      cell: (profile) => profile.material?.name ?? '–',
    },
    {
      key: 'owner',
      head: 'Owner',
      wide: true,
      plain: (profile) => profile.owner.name,
      cell: (profile) => <span className="whitespace-nowrap">{profile.owner.name}</span>,
    },
    {
      key: 'revision',
      head: 'Revision',
      wide: true,
      plain: (profile) => profile.latest?.letter ?? null,
      cell: ({ latest }) =>
        latest ? <StateBadge letter={latest.letter} state={latest.state} /> : <span className="text-soft">none yet</span>,
    },
    ...FIGURES.map(
      ({ key, name, sub, quantity, unit, sort }): Column<Profile> => ({
        key,
        head: (
          <>
            {name}
            {sub && <sub>{names[sub]}</sub>}
          </>
        ),
        sort,
        figure: true,
        wide: key !== 'mass',
        plainHead: `${name}${sub ?? ''} [${unit}]`,
        plain: ({ latest }) => latest?.figures[key] ?? null,
        cell: ({ latest }) => <FigureText value={latest?.figures[key] ?? null} quantity={quantity} />,
      }),
    ),
  ]
  return ofJob ? columns.filter(({ key }) => key !== 'job') : columns
}

export function ProfilesTable({
  profiles,
  columns,
  sorting,
  busy,
}: {
  profiles: readonly Profile[]
  columns: Column<Profile>[]
  sorting?: Sorting
  busy?: boolean
}) {
  const [changed, setChanged] = useState<Profile | null>(null)
  const mayEdit = useMay('profile.edit')
  const mayUpload = useMay('revision.add')
  const { binProfile, restoreProfile } = useBinning()
  const actions = (profile: Profile): (MenuItem | 'line')[] => {
    if (profile.binnedAt) return [{ label: 'Restore', onChoose: () => restoreProfile(profile) }]
    const upload: MenuItem[] = mayUpload ? [{ label: 'Upload a drawing', href: `/profiles/${profile.id}/upload` }] : []
    return [
      ...upload,
      { label: 'Change …', onChoose: () => setChanged(profile) },
      'line',
      { label: 'Move to bin', danger: true, onChoose: () => binProfile(profile) },
    ]
  }
  const withActions: Column<Profile>[] = [
    ...columns,
    {
      key: 'do',
      head: <span className="sr-only">Actions</span>,
      cell: (profile) => (
        <Menu label="⋯" name={`Actions for ${profile.number}`} className="flex justify-end" items={actions(profile)} />
      ),
    },
  ]
  return (
    <>
      <Table
        caption="Profiles"
        columns={mayEdit ? withActions : columns}
        rows={profiles}
        rowKey={(profile) => profile.id}
        sorting={sorting}
        busy={busy}
      />
      <Dialog title={`Change ${changed?.number ?? ''}`} open={changed !== null} onClose={() => setChanged(null)}>
        {changed && <ProfileForm profile={changed} onDone={() => setChanged(null)} />}
      </Dialog>
    </>
  )
}
