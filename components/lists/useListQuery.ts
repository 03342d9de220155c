'use client'
import { useCallback } from 'react'
import type { Sorting } from '@/components/ui/Table'
import { useUrlState } from '@/components/ui/useUrlState'
import { type ListDefaults, listPath, listQuery } from './listPath'

/** What a list shows, kept in the URL: filter, sort, page, bin. */
export function useListQuery(api: string, defaults: ListDefaults) {
  const [query, change] = useUrlState()
  const asking = listQuery(query, defaults)
  const sorting: Sorting = {
    by: asking.get('sort') ?? defaults.sort,
    dir: asking.get('dir') === 'asc' ? 'asc' : 'desc',
    onSort: (sort, dir) => change({ sort, dir, cursor: null }),
  }
  return {
    path: listPath(api, query, defaults),
    asking,
    asked: query.get('q') ?? '',
    bin: query.get('bin') === 'true',
    paged: query.has('cursor'),
    sorting,
    change,
    onAsk: useCallback((q: string) => change({ q, cursor: null }), [change]),
    onBin: (on: boolean) => change({ bin: on ? 'true' : null, cursor: null }),
    toPage: (cursor: string | null) => change({ cursor }, 'push'),
  }
}
