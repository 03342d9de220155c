import type { Profile } from '@/lib/api/schemas/profile'
import { jobNumber, profileNumber } from './counter'
import { letterOf } from './letter'
import type { ProfileTable } from './schema'

export const profileColumns = [
  'profile.id',
  'profile.number',
  'profile.title',
  'profile.drawingNumber',
  'profile.revisions',
  'profile.createdAt',
  'profile.updatedAt',
  'profile.binnedAt',
  'profile.version',
  'profile.area',
  'profile.mass',
  'profile.ix',
  'profile.iy',
  'profile.i1',
  'profile.i2',
  'profile.theta',
  'profile.circle',
  'job.id as jobId',
  'job.number as jobNumber',
  'job.title as jobTitle',
  'profile.ownerId',
  'owner.name as ownerName',
  'material.id as materialId',
  'material.name as materialName',
  'revision.id as revisionId',
  'revision.position as revisionPosition',
  'revision.state as revisionState',
  'revision.createdAt as revisionAt',
] as const

type Own = Omit<ProfileTable, 'teamId' | 'jobId' | 'materialId' | 'ownerId' | 'latestRevisionId'>
export interface ProfileRow extends Own {
  jobId: string
  jobNumber: number
  jobTitle: string
  ownerId: string
  ownerName: string | null
  materialId: string | null
  materialName: string | null
  revisionId: string | null
  revisionPosition: number | null
  revisionState: string | null
  revisionAt: string | null
}

export const toProfileView = (row: ProfileRow): Profile => ({
  id: row.id,
  number: profileNumber(row.number),
  title: row.title,
  drawingNumber: row.drawingNumber,
  job: { id: row.jobId, number: jobNumber(row.jobNumber), title: row.jobTitle },
  material: row.materialId === null ? null : { id: row.materialId, name: row.materialName ?? '' },
  owner: { id: row.ownerId, name: row.ownerName ?? '' },
  latest: latestOf(row),
  revisions: row.revisions,
  createdAt: row.createdAt,
  updatedAt: row.updatedAt,
  binnedAt: row.binnedAt,
  version: row.version,
})

function latestOf(row: ProfileRow): Profile['latest'] {
  const { revisionId, revisionPosition, revisionState, revisionAt, area, mass, ix, iy, i1, i2, theta, circle } = row
  if (revisionId === null || revisionPosition === null || revisionState === null || revisionAt === null) return null
  if (area === null || ix === null || iy === null || i1 === null || i2 === null || circle === null) return null
  const figures = { area, mass, ix, iy, i1, i2, theta, circle }
  return { id: revisionId, letter: letterOf(revisionPosition), state: revisionState, createdAt: revisionAt, figures }
}
