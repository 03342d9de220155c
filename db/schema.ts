import type { TeamId } from './id'

type Json = string
type Flag = 0 | 1

export interface TeamTable {
  id: TeamId
  name: string
  settings: Json
  version: number
  createdAt: string
}
export interface UserTable {
  id: string
  name: string
  email: string
  passwordHash: string
  zone: string
  createdAt: string
}
export interface MembershipTable {
  teamId: TeamId
  userId: string
  roles: Json
  administrator: Flag
  disabled: Flag
  version: number
  createdAt: string
}
export interface SessionTable {
  idHash: string
  userId: string
  teamId: TeamId
  createdAt: string
  expiresAt: string
}
export interface InvitationTable {
  id: string
  teamId: TeamId
  email: string
  roles: Json
  administrator: Flag
  tokenHash: string
  invitedBy: string
  createdAt: string
  expiresAt: string
  spentAt: string | null
}
export interface MaterialTable {
  id: string
  teamId: TeamId
  name: string
  density: number
  source: string
  version: number
  createdAt: string
}
export interface JobTable {
  id: string
  teamId: TeamId
  number: number
  title: string
  client: string
  createdAt: string
  createdBy: string
  updatedAt: string
  binnedAt: string | null
  version: number
}
/** The figures by which lists sort and filter; all null before there is a revision. */
interface FigureColumns {
  area: number | null
  mass: number | null
  ix: number | null
  iy: number | null
  i1: number | null
  i2: number | null
  theta: number | null
  circle: number | null
}
export interface ProfileTable extends FigureColumns {
  id: string
  teamId: TeamId
  jobId: string
  number: number
  title: string
  drawingNumber: string
  materialId: string | null
  ownerId: string
  latestRevisionId: string | null
  revisions: number
  createdAt: string
  updatedAt: string
  binnedAt: string | null
  version: number
}
export interface SourceFileTable {
  id: string
  teamId: TeamId
  sha256: string
  bytes: number
  blobId: string
  createdAt: string
}
export interface ChunkTable {
  blobId: string
  n: number
  data: Uint8Array
}
export interface IntakeTable {
  id: string
  teamId: TeamId
  userId: string
  profileId: string
  key: string | null
  fileName: string
  sha256: string
  bytes: number
  form: Json
  attempts: number
  createdAt: string
}
export interface RevisionTable {
  id: string
  teamId: TeamId
  profileId: string
  position: number
  state: string
  recipe: Json
  confirmation: Json | null
  drawingRevision: string
  note: string
  sourceFileId: string
  fileName: string
  material: Json | null
  opinions: Json | null
  createdAt: string
  createdBy: string
  version: number
}
export interface SectionTable extends FigureColumns {
  revisionId: string
  teamId: TeamId
  engineVersion: string
  answer: Json
  regionBlobId: string
}
export interface EventTable {
  id: string
  teamId: TeamId
  at: string
  actorId: string | null
  verb: string
  subjectType: string
  subjectId: string
  before: Json | null
  after: Json | null
  requestId: string | null
}
export interface CounterTable {
  teamId: TeamId
  noun: string
  value: number
}
export interface IdempotencyTable {
  userId: string
  key: string
  teamId: TeamId
  bodyHash: string
  status: number | null
  resultId: string | null
  body: Json | null
  createdAt: string
}
export interface RateLimitTable {
  bucket: string
  tokens: number
  at: string
}

export interface Schema {
  team: TeamTable
  user: UserTable
  membership: MembershipTable
  session: SessionTable
  invitation: InvitationTable
  material: MaterialTable
  job: JobTable
  profile: ProfileTable
  sourceFile: SourceFileTable
  chunk: ChunkTable
  intake: IntakeTable
  revision: RevisionTable
  section: SectionTable
  event: EventTable
  counter: CounterTable
  idempotency: IdempotencyTable
  rateLimit: RateLimitTable
}
