'use client'
import Link from 'next/link'
import { Button } from '@/components/ui/Button'
import { Notice } from '@/components/ui/Notice'
import type { FlowAction, FlowState } from './flow/flow'
import { useKnownFile } from './useKnownFile'

const size = (bytes: number) =>
  bytes < 1024 ? `${bytes} B` : bytes < 1024 ** 2 ? `${Math.round(bytes / 1024)} kB` : `${(bytes / 1024 ** 2).toFixed(1)} MB`

/** The file, undo and redo; says where the team already has this very file. */
export function FileLine({
  file,
  state,
  dispatch,
  onOther,
}: {
  file: File
  state: FlowState
  dispatch: (action: FlowAction) => void
  onOther: () => void
}) {
  const uses = useKnownFile(file)
  const { past, future } = state.history
  return (
    <>
      <div className="flex flex-wrap items-center gap-x-3 pb-1">
        <span className="min-w-0 truncate font-mono">{file.name}</span>
        <span className="text-small text-soft">{size(file.size)}</span>
        <span className="ml-auto flex">
          <Button
            look="quiet"
            shortcut="Control+Z"
            title="Undo"
            disabled={past.length === 0}
            onClick={() => dispatch({ type: 'undo' })}
          >
            Undo
          </Button>
          <Button
            look="quiet"
            shortcut="Control+Shift+Z"
            title="Redo"
            disabled={future.length === 0}
            onClick={() => dispatch({ type: 'redo' })}
          >
            Redo
          </Button>
          <Button look="quiet" onClick={onOther}>
            Other file
          </Button>
        </span>
      </div>
      {uses.length > 0 && (
        <Notice tone="asked">
          <b>The team has this file already:</b>{' '}
          {uses.map(({ profileId, number, letter }) => (
            <Link key={`${profileId} ${letter}`} href={`/profiles/${profileId}`} className="mr-2 text-accent underline">
              {number} {letter}
            </Link>
          ))}
        </Notice>
      )}
    </>
  )
}
