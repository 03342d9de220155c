import { z } from 'zod'
import { ROLES } from '@/lib/auth/permissions'
import { Id, Timestamp, Version } from './common'

export const RoleName = z.enum(ROLES)
const email = z
  .email()
  .max(254)
  .transform((text) => text.toLowerCase())
const password = z.string().min(10, 'at least 10 characters').max(200)

/** POST /api/v1/setup: the first visit. `code` is asked where the server listens beyond this machine. */
export const SetUp = z.strictObject({
  team: z.string().trim().min(1).max(120),
  name: z.string().trim().min(1).max(120),
  email,
  password,
  code: z.string().optional(),
})

/** GET /api/v1/setup. */
export const SetUpState = z.object({ needed: z.boolean(), code: z.boolean() })

/** How a team shows figures. */
export const TeamSettings = z.strictObject({
  lengthUnit: z.enum(['mm', 'cm', 'in']),
  digits: z.int().min(3).max(12),
  symbols: z.enum(['en', 'us']),
  axes: z.enum(['xy', 'yz']),
})
export const Team = z.object({ id: Id, name: z.string(), settings: TeamSettings, version: Version })
export const TeamChange = z.strictObject({
  name: z.string().trim().min(1).max(120).optional(),
  settings: TeamSettings.partial().optional(),
})

export const Me = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  roles: z.array(RoleName),
  administrator: z.boolean(),
  zone: z.string(),
  team: Team,
  teams: z.array(z.object({ id: Id, name: z.string() })),
})
export const MeChange = z.strictObject({
  name: z.string().trim().min(1).max(120).optional(),
  zone: z.string().max(64).optional(),
  teamId: Id.optional(),
})

export const Person = z.object({
  id: Id,
  name: z.string(),
  email: z.string(),
  roles: z.array(RoleName),
  administrator: z.boolean(),
  disabled: z.boolean(),
  version: Version,
})
export const PersonChange = z.strictObject({
  roles: z.array(RoleName).optional(),
  administrator: z.boolean().optional(),
  disabled: z.boolean().optional(),
})

export const Invite = z.strictObject({ email, roles: z.array(RoleName).min(1), administrator: z.boolean().default(false) })
/** `url` is shown once, when the invitation is made. */
export const Invitation = z.object({
  id: Id,
  email: z.string(),
  roles: z.array(RoleName),
  administrator: z.boolean(),
  expiresAt: Timestamp,
  url: z.string().optional(),
})
export const InvitationToken = z.object({ token: z.string().max(100) })
/** What the page of an invitation's link shows; `known`: the address has an account, its own password is asked. */
export const InvitationLookup = Invitation.omit({ id: true, url: true }).extend({ team: z.string(), known: z.boolean() })
export const AcceptInvitation = z.strictObject({ token: z.string(), name: z.string().trim().min(1).max(120), password })

export const MaterialFields = z.strictObject({
  name: z.string().trim().min(1).max(120),
  density: z.number().positive().max(30000),
  source: z.string().trim().max(200),
})
export const Material = MaterialFields.extend({ id: Id, version: Version })
export type SetUp = z.infer<typeof SetUp>
export type TeamSettings = z.infer<typeof TeamSettings>
export type Team = z.infer<typeof Team>
export type TeamChange = z.infer<typeof TeamChange>
export type Me = z.infer<typeof Me>
export type MeChange = z.infer<typeof MeChange>
export type Person = z.infer<typeof Person>
export type PersonChange = z.infer<typeof PersonChange>
export type Invite = z.infer<typeof Invite>
export type Invitation = z.infer<typeof Invitation>
export type AcceptInvitation = z.infer<typeof AcceptInvitation>
export type MaterialFields = z.infer<typeof MaterialFields>
export type Material = z.infer<typeof Material>
export type SetUpState = z.infer<typeof SetUpState>
export type InvitationLookup = z.infer<typeof InvitationLookup>
