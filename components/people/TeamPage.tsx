'use client'
import { useMe } from '@/components/shell/Me'
import { PageHead } from '@/components/shell/PageHead'
import { MaterialsTable } from './MaterialsTable'
import { PeopleTable } from './PeopleTable'
import { TeamSettings } from './TeamSettings'

export function TeamPage() {
  const { team } = useMe()
  return (
    <>
      <PageHead title={team.name} />
      <div className="grid max-w-5xl grid-cols-[minmax(0,1fr)] gap-2">
        <PeopleTable />
        <TeamSettings />
        <MaterialsTable />
      </div>
    </>
  )
}
