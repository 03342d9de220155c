export interface ListDefaults {
  sort: string
  dir: 'asc' | 'desc'
  /** what the page itself narrows the list to */
  fixed?: Record<string, string>
}

const ASKED = ['sort', 'dir', 'q', 'bin', 'cursor', 'ownerId', 'materialId'] as const

/** What a list asks of the API, from the URL of its page: the same in page and browser, as it is SWR's key. */
export function listQuery(query: URLSearchParams, { sort, dir, fixed = {} }: ListDefaults): URLSearchParams {
  const asking = new URLSearchParams({ ...fixed, sort, dir })
  for (const name of ASKED) {
    const value = query.get(name)
    if (value) asking.set(name, value)
  }
  return asking
}

export const listPath = (api: string, query: URLSearchParams, defaults: ListDefaults) =>
  `${api}?${listQuery(query, defaults).toString()}`

/** The query of a page as Next gives it, first value of each name. */
export function pageQuery(params: Record<string, string | string[] | undefined>): URLSearchParams {
  const query = new URLSearchParams()
  for (const [name, value] of Object.entries(params)) {
    const first = Array.isArray(value) ? value[0] : value
    if (first !== undefined) query.set(name, first)
  }
  return query
}
