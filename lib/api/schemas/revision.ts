import { z } from 'zod'
import { Id, Timestamp, Version } from './common'
import { ProfileFigures } from './profile'
import { Finding, Section, SectionAnswer } from './section'

/** How a person confirmed unit and size: a dimension known from elsewhere, or one drawn that agrees. */
export const SizeConfirmation = z.strictObject({
  by: z.enum(['typed', 'drawn']),
  /** the dimension, mm, as known from elsewhere */
  value: z.number().positive(),
  /** what the drawing gives for it with this recipe, mm */
  measured: z.number().positive(),
  what: z.string().max(200),
  finished: z.enum(['finished', 'die']),
})

/** Multipart fields of POST /api/v1/profiles/{id}/revisions beside `file` (or `fileSha256` of one the team has). */
export const RevisionFields = z.strictObject({
  drawingRevision: z.string().trim().max(40).default(''),
  note: z.string().trim().max(2000).default(''),
  confirmation: SizeConfirmation.nullable().default(null),
  /** the figures the browser showed; the save is refused where the server's differ beyond rounding */
  shown: z.record(z.string(), z.number().nullable()).nullable().default(null),
})

export const Opinion = z.object({ library: z.string(), agrees: z.boolean().nullable(), sentence: z.string() })

export const UsedMaterial = z.object({ id: z.string(), name: z.string(), density: z.number(), source: z.string() })

export const Revision = z.object({
  id: Id,
  profileId: Id,
  letter: z.string(),
  state: z.enum(['draft', 'in review', 'released', 'superseded', 'withdrawn']),
  drawingRevision: z.string(),
  note: z.string(),
  confirmation: SizeConfirmation.nullable(),
  file: z.object({
    name: z.string(),
    bytes: z.int(),
    sha256: z.string(),
    alsoIn: z.array(z.object({ profileId: Id, number: z.string(), letter: z.string() })),
  }),
  answer: SectionAnswer,
  material: UsedMaterial.nullable(),
  opinions: z.array(Opinion).nullable(),
  createdAt: Timestamp,
  createdBy: z.object({ id: Id, name: z.string() }),
  version: Version,
})
/** A row of GET /api/v1/profiles/{id}/revisions. */
export const RevisionSummary = Revision.pick({
  id: true,
  profileId: true,
  letter: true,
  state: true,
  drawingRevision: true,
  note: true,
  createdAt: true,
  createdBy: true,
  version: true,
}).extend({
  file: z.object({ name: z.string(), bytes: z.int(), sha256: z.string() }),
  engineVersion: z.string(),
  figures: ProfileFigures,
})
/** 201 of POST /api/v1/profiles/{id}/revisions. */
export const RevisionAdded = z.object({ revision: Revision, section: Section, findings: z.array(Finding) })
/** GET /api/v1/files?sha256= : where the team already has this file. */
export const FileQuery = z.object({ sha256: z.string().regex(/^[0-9a-f]{64}$/) })
export const FileUses = z.object({
  known: z.boolean(),
  uses: z.array(z.object({ revisionId: Id, profileId: Id, number: z.string(), title: z.string(), letter: z.string() })),
})
/** A row of GET /api/v1/intakes: an upload of one's own that the server has taken in and still computes. */
export const OpenIntake = z.object({
  id: Id,
  profileId: Id,
  number: z.string(),
  title: z.string(),
  fileName: z.string(),
  bytes: z.int(),
  createdAt: Timestamp,
})
/** 422 of an upload that gives no section. */
export const NoSection = z.object({ findings: z.array(Finding) })
export type SizeConfirmation = z.infer<typeof SizeConfirmation>
export type RevisionFields = z.infer<typeof RevisionFields>
export type Opinion = z.infer<typeof Opinion>
export type Revision = z.infer<typeof Revision>
export type NoSection = z.infer<typeof NoSection>
export type UsedMaterial = z.infer<typeof UsedMaterial>
export type RevisionSummary = z.infer<typeof RevisionSummary>
export type RevisionAdded = z.infer<typeof RevisionAdded>
export type OpenIntake = z.infer<typeof OpenIntake>
export type FileUses = z.infer<typeof FileUses>
