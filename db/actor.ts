import type { Role } from '@/lib/auth/permissions'
import type { TeamId } from './id'

/** Who writes: `userId` is null where the server itself does (sweeping, recovery). */
export interface Writer {
  teamId: TeamId
  userId: string | null
  requestId: string | null
}

/** A person signed in, in the team of their session. */
export interface Actor extends Writer {
  userId: string
  roles: readonly Role[]
  administrator: boolean
}
