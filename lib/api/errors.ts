/** The closed list of error codes: status and sentence with what to do. Anything else is logged and answered 500. */
export const ERRORS = {
  signed_out: { status: 401, title: 'You are not signed in. Sign in and try again; what you typed is kept.' },
  wrong_password: { status: 401, title: 'E-mail or password is wrong.' },
  forbidden: { status: 403, title: 'Your role does not allow this. Ask an administrator of the team.' },
  bad_origin: { status: 403, title: 'This request came from another site and was refused.' },
  not_found: { status: 404, title: 'There is nothing here, or it belongs to another team.' },
  stale: { status: 412, title: 'Somebody changed this since you opened it. Both versions are shown.' },
  frozen: { status: 409, title: 'This is released and cannot be changed. Make a new revision.' },
  in_progress: { status: 409, title: 'The same upload is still being worked on. Its result will be here in a moment.' },
  binned: { status: 409, title: 'This is in the bin. Restore it first.' },
  last_administrator: { status: 409, title: 'A team needs an administrator. Name another one first.' },
  taken: { status: 409, title: 'That is taken already. Choose another.' },
  set_up: { status: 409, title: 'This server is set up already. Sign in.' },
  too_large: { status: 413, title: 'The file is larger than this server takes.' },
  not_multipart: { status: 415, title: 'Send the file as multipart form data.' },
  invalid: { status: 422, title: 'Something in the request cannot be used.' },
  no_section: { status: 422, title: 'The drawing gives no section as it is. The findings say why.' },
  key_reused: { status: 422, title: 'This idempotency key was used with another request.' },
  disagreement: { status: 422, title: 'Browser and server do not agree on the figures, so nothing was saved.' },
  missing_version: { status: 428, title: 'Send the version you saw in If-Match.' },
  too_many: { status: 429, title: 'Too many attempts. Wait a moment and try again.' },
  code_wrong: { status: 403, title: 'The one-time code is wrong. It is printed where the server was started.' },
  link_spent: { status: 410, title: 'This link is used up or has run out. Ask for a new one.' },
  storage_full: { status: 507, title: 'The disk of the server is full. Nothing was saved; free space and try again.' },
  compute_limit: { status: 422, title: 'The drawing needs more time or memory than this server allows.' },
  internal: { status: 500, title: 'Something failed on the server. Quote the request id to whoever runs it.' },
} as const satisfies Record<string, { status: number; title: string }>

export type ErrorCode = keyof typeof ERRORS

/** An expected failure of db or routes. Told apart by `kind`, because classes differ after a hot reload. */
export class AppError extends Error {
  readonly kind = 'app'
  constructor(
    readonly code: ErrorCode,
    readonly detail?: string,
    /** further members of the problem document: `findings`, `current`, `issues`, `retryAfter` */
    readonly extra: Record<string, unknown> = {},
  ) {
    super(detail ?? ERRORS[code].title)
  }
}

export function isAppError(error: unknown): error is AppError {
  return typeof error === 'object' && error !== null && 'kind' in error && error.kind === 'app'
}
