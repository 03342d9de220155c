import type { Profile } from '@/lib/api/schemas/profile'

/** Where the drawing goes: onto a profile, or onto a new one of this job. */
export type Target =
  | { kind: 'profile'; profile: Profile }
  | { kind: 'new'; jobId: string; title: string; materialId: string | null }
