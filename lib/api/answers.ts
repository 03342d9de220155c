import { z } from 'zod'
import { page, Problem } from './schemas/common'
import { Event } from './schemas/event'
import { Job } from './schemas/job'
import { Invitation, Material, Me, Person, Team } from './schemas/people'
import { Profile } from './schemas/profile'
import { OpenIntake, Revision, RevisionSummary } from './schemas/revision'
import { Finding } from './schemas/section'

const items = <T extends z.ZodType>(item: T) => z.object({ items: z.array(item) })

/** Everything that the browser reads from the server. Loaded with the first answer: see `client.ts`. */
export { Invitation, Job, Material, Me, Person, Profile, Revision, Team }
export const Jobs = page(Job)
export const Profiles = page(Profile)
export const Events = page(Event)
export const Revisions = items(RevisionSummary)
export const Intakes = items(OpenIntake)
export const People = items(Person)
export const Invitations = items(Invitation)
export const Materials = items(Material)
export const Saved = z.object({ revision: Revision })
export const Uses = z.object({ uses: z.array(z.object({ profileId: z.string(), number: z.string(), letter: z.string() })) })
export const Csrf = z.object({ csrfToken: z.string() })
export const SignedIn = z.object({ url: z.string() })
/** where nothing of the answer is read */
export const Anything = z.unknown()
/** A problem document; what it may tell beside its code is left out where it is not as agreed. */
export const Refusal = Problem.extend({
  issues: z.array(z.object({ path: z.string(), message: z.string() })).catch([]),
  findings: z.array(Finding).catch([]),
  current: z.unknown(),
})
