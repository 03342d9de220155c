import { z } from 'zod'
import { Id, Timestamp } from './common'

/** What can happen, each with its sentence; `{subject}` and names are put in by the screen. */
export const VERBS = {
  'team.created': 'made the team',
  'team.changed': 'changed the team',
  'person.invited': 'invited somebody',
  'invitation.withdrawn': 'withdrew an invitation',
  'person.joined': 'joined the team',
  'person.changed': 'changed what somebody may do',
  'password.reset': 'set a new password for somebody',
  'material.added': 'added a material',
  'material.changed': 'changed a material',
  'job.opened': 'opened the job',
  'job.changed': 'changed the job',
  'job.binned': 'put the job into the bin',
  'job.restored': 'took the job back from the bin',
  'job.purged': 'emptied the job from the bin',
  'profile.added': 'added the profile',
  'profile.changed': 'changed the profile',
  'profile.binned': 'put the profile into the bin',
  'profile.restored': 'took the profile back from the bin',
  'profile.purged': 'emptied the profile from the bin',
  'revision.added': 'saved a revision',
  'opinions.stored': 'stored the second opinions on a revision',
  'upload.given_up': 'gave up an upload that could not be finished',
  'demo.loaded': 'loaded the demo data',
} as const
export type Verb = keyof typeof VERBS
export const SubjectType = z.enum(['team', 'person', 'invitation', 'material', 'job', 'profile', 'revision', 'intake'])
export type SubjectType = z.infer<typeof SubjectType>

const changed = z.record(z.string(), z.unknown()).nullable()
export const Event = z.object({
  id: Id,
  at: Timestamp,
  actor: z.object({ id: Id, name: z.string() }).nullable(),
  verb: z.string(),
  sentence: z.string(),
  subjectType: SubjectType,
  subjectId: Id,
  before: changed,
  after: changed,
})
export const EventQuery = z.object({
  subjectId: Id.optional(),
  cursor: z.string().optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
})
export type Event = z.infer<typeof Event>
export type EventQuery = z.infer<typeof EventQuery>
