'use client'
import { useMemo } from 'react'
import { type Bundles, bundlesOf } from '@/lib/section/bundles'
import { extremesOf } from '@/lib/section/extremes'
import type { Shows } from '@/lib/section/figures/figure'
import { FIGURES } from '@/lib/section/figures/index'
import { frameAt } from '@/lib/section/frame'
import { plasticBending } from '@/lib/section/plastic'
import type { Section } from '@/lib/section/types'
import { type Annotations, emptyAnnotations } from './annotation'
import { AnnotationLayer } from './AnnotationLayer'
import type { Shown, Writing } from './annotate'
import { annotateHot, freePlasticAngle, hotAxes } from './annotateHot'
import type { Frame } from './axisLines'
import type { HoverStore } from './hover'
import { boxAt, placeLabels } from './labels'
import type { BoardModel } from './model'
import { useHover } from './useHover'
import { transformOf } from './view'

interface Props {
  model: BoardModel
  hover: HoverStore
  frame: Frame
  shown: Shown
  writing: Writing
  base: Annotations
  choices: Record<string, number>
}

/** What the hovered figure or outline looks like on the board. Nothing else is drawn again for it. */
export function HotLayer({ model, hover, frame, shown, writing, base, choices }: Props) {
  const key = useHover(hover, (hovered) => (hovered?.kind === 'figure' ? hovered.key : null))
  const outline = useHover(hover, (hovered) => (hovered?.kind === 'outline' ? hovered.id : null))
  const figure = FIGURES.find((row) => row.key === key)
  const picked = model.outlines.find(({ id }) => id === outline)
  const bundles = useMemo(() => model.region && bundlesOf(model.region), [model.region])
  const annotations = useMemo(() => {
    if (!model.section || !figure) return emptyAnnotations()
    const offset = bundles ? freePlasticOffset(model.section, figure.shows, bundles) : 0
    return annotateHot(model.section, frame, figure.shows, shown, writing, offset)
  }, [model.section, bundles, frame, figure, shown, writing])
  const held = base.labels.map((label) => boxAt(label, label.places[choices[label.id] ?? 0]))
  const placed = placeLabels(annotations.labels, [...base.lines, ...annotations.lines], frame.viewport, held)
  const axisIds: string[] = model.section && figure ? hotAxes(model.section, figure.shows) : []
  const overlaid: Annotations = {
    ...emptyAnnotations(),
    labels: base.labels.filter((label) => axisIds.includes(label.id)).map((label) => ({ ...label, look: 'principal' })),
  }
  const lit = figure && litPath(model, figure.shows)
  return (
    <g pointerEvents="none">
      {lit && (
        <g transform={transformOf(frame.view, model.origin)}>
          <path d={lit} className="fill-none stroke-accent" strokeWidth={2.6} vectorEffect="non-scaling-stroke" />
        </g>
      )}
      {picked && (
        <g transform={transformOf(frame.view, model.origin)}>
          <path
            d={picked.path}
            className="fill-accent stroke-accent"
            fillOpacity={0.14}
            strokeWidth={3}
            vectorEffect="non-scaling-stroke"
          />
        </g>
      )}
      <AnnotationLayer annotations={annotations} choices={placed} />
      <AnnotationLayer annotations={overlaid} choices={choices} />
    </g>
  )
}

/** Where the neutral axis of free plastic bending lies, mm to the left of the centroid. */
function freePlasticOffset(section: Section, shows: Shows, bundles: Bundles): number {
  const angle = freePlasticAngle(section, shows)
  if (angle === null) return 0
  const frame = frameAt(section.centroid.x, section.centroid.y, angle)
  return plasticBending(bundles, frame, extremesOf(bundles, frame)).offset
}

/** The outline that a figure is about: all of the metal, its outer loops, or its holes. */
function litPath(model: BoardModel, shows: Shows): string | null {
  if (shows === 'region') return model.metal
  if (shows === 'outer') return model.outer
  if (shows === 'inner') return model.inner
  return null
}
