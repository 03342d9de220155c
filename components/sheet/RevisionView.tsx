'use client'
import { useMemo, useReducer, useState } from 'react'
import { Board } from '@/components/board/Board'
import { boardReducer, initialBoard } from '@/components/board/boardState'
import { createHover } from '@/components/board/hover'
import { regionModel } from '@/components/board/regionModel'
import { sheetAround, zoneOf } from '@/components/board/zones'
import { Notice } from '@/components/ui/Notice'
import { Tabs } from '@/components/ui/Tabs'
import type { TeamSettings } from '@/lib/api/schemas/people'
import type { Profile } from '@/lib/api/schemas/profile'
import type { Revision, RevisionSummary } from '@/lib/api/schemas/revision'
import type { Region } from '@/lib/geometry/region'
import { bundlesOf } from '@/lib/section/bundles'
import { BoardBoundary } from './BoardBoundary'
import { Cautions } from './Cautions'
import { DisplaySwitch } from './DisplaySwitch'
import { useEvents } from './data'
import { FindingsList } from './FindingsList'
import { History } from './History'
import { MakeUpList } from './MakeUpList'
import { Opinions } from './Opinions'
import { RevisionsList } from './RevisionsList'
import { SectionSheet } from './SectionSheet'
import { SharePanel } from './SharePanel'
import { TitleBlock } from './TitleBlock'
import { UserAxisPanel } from './UserAxisPanel'
import { writingOf } from './writing'

interface Props {
  profile: Profile
  revision: Revision
  revisions: RevisionSummary[]
  region: Region | undefined
  regionFault: unknown
  display: TeamSettings
  onDisplay: (next: TeamSettings) => void
}

/** The least size a finding is shown at, as a share of the drawing. */
const LEAST_PLACE = 1 / 25

/** Board and section sheet of one revision: the board stays in view while the sheet is read. */
export function RevisionView({ profile, revision, revisions, region, regionFault, display, onDisplay }: Props) {
  const { answer } = revision
  const [state, dispatch] = useReducer(boardReducer, initialBoard)
  const [hover] = useState(createHover)
  const [picked, setPicked] = useState<string | null>(null)
  const [tab, setTab] = useState('sheet')
  const { data: events } = useEvents(profile.id)
  const model = useMemo(() => region && regionModel(region, answer), [region, answer])
  const bundles = useMemo(() => region && bundlesOf(region), [region])
  const writing = useMemo(() => writingOf(display), [display])
  const sheet = useMemo(() => model && sheetAround(model.extents), [model])
  const markOf = (index: number) => model?.marks.find((mark) => mark.index === index)

  const show = (index: number) => {
    const mark = markOf(index)
    if (!mark || !model) return
    const { minX, maxX, minY, maxY } = model.extents
    const least = LEAST_PLACE * Math.max(maxX - minX, maxY - minY)
    dispatch({ do: 'goTo', at: mark.at, size: Math.max(mark.size, least) })
  }
  const zone = (index: number) => {
    const mark = markOf(index)
    return mark && sheet ? zoneOf(sheet, mark.at) : null
  }
  const pick = (id: string | null) => {
    setPicked(id)
    if (answer.outlines.some((outline) => outline.id === id)) setTab('makeUp')
  }

  const tabs = [
    {
      key: 'sheet',
      label: 'Section',
      panel: (
        <>
          {answer.section && <SectionSheet section={answer.section} display={display} hover={hover} />}
          {answer.section && bundles && (
            <>
              <SharePanel {...{ bundles, display, state, dispatch }} section={answer.section} />
              <UserAxisPanel {...{ bundles, display, state, dispatch }} section={answer.section} />
            </>
          )}
          <Cautions answer={answer} />
        </>
      ),
    },
    { key: 'makeUp', label: 'Make-up', panel: <MakeUpList {...{ answer, display, hover, picked }} /> },
    {
      key: 'revisions',
      label: 'Revisions',
      panel: <RevisionsList profileId={profile.id} revisions={revisions} shown={revision.id} />,
    },
    {
      key: 'history',
      label: 'History',
      panel: events && <History events={events.items} total={events.total} revisions={revisions} />,
    },
  ]
  return (
    <div className="grid grid-cols-1 items-start gap-x-5 gap-y-4 lg:grid-cols-[minmax(0,1fr)_25.5rem] xl:grid-cols-[minmax(0,1fr)_28rem]">
      <div className="lg:sticky lg:top-4">
        {regionFault ? (
          <Notice tone="error">
            <b>The picture could not be read from the server.</b> The figures beside it are stored and stay right.
          </Notice>
        ) : (
          <BoardBoundary>
            {model ? (
              <Board
                {...{ model, state, dispatch, hover, writing }}
                label={`Section of ${profile.number}, revision ${revision.letter}, with its axes`}
                onPick={pick}
              >
                <TitleBlock revision={revision} />
              </Board>
            ) : (
              <div
                className="h-[22rem] border border-hair bg-sheet md:h-[clamp(22rem,calc(100dvh-var(--board-around,18rem)),56rem)]"
                aria-busy="true"
              />
            )}
          </BoardBoundary>
        )}
      </div>
      <div className="min-w-0">
        <div className="flex items-baseline justify-between gap-3">
          <h2 className="font-semibold">Section sheet</h2>
          <DisplaySwitch display={display} onChange={onDisplay} />
        </div>
        <FindingsList {...{ zone, show, hover }} findings={answer.findings} total={answer.findingsTotal} />
        <Opinions opinions={revision.opinions} />
        <Tabs label="What belongs to this revision" tabs={tabs} chosen={tab} onChoose={setTab} />
      </div>
    </div>
  )
}
