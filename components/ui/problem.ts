import { isProblem, type ProblemError } from '@/lib/api/client'

/** What went wrong, as a person reads it. */
export interface Problem {
  code: string
  sentence: string
  requestId?: string
  /** what is wrong with each field of the form, by its name */
  fields: Record<string, string>
  findings: ProblemError['problem']['findings']
  /** the row as it stands now, where somebody changed it meanwhile */
  current: unknown
}

/** Any caught error as a problem; a failed connection says so in words. */
export function problemOf(error: unknown): Problem {
  if (!isProblem(error)) {
    const offline = error instanceof TypeError
    const sentence = offline
      ? 'The server did not answer. What you typed is kept; try again when the connection is back.'
      : error instanceof Error
        ? error.message
        : 'Something failed.'
    return { code: offline ? 'offline' : 'internal', sentence, fields: {}, findings: [], current: undefined }
  }
  const { code, title, detail, requestId, issues, findings, current } = error.problem
  const fields: Record<string, string> = {}
  for (const { path, message } of issues) fields[path] ??= message
  return { code, sentence: detail ?? title, requestId, fields, findings, current }
}
