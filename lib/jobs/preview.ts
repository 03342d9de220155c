import type { EdgeTable } from '../geometry/edges'
import type { Recipe } from '../geometry/recipe'
import type { UsedMaterial } from './answer'
import type { DrawingView, PreviewResult, Stage } from './previewProtocol'
import type { Extent, SectionTask, TaskResult } from './tasks'

/** What the page is sent: the task keeps its own tables, so copies cut to length go out. */
export function previewOf(
  task: SectionTask,
  recipe: Recipe,
  materials: Record<string, UsedMaterial>,
  onStage: (stage: Stage) => void,
  extent: Extent = 'all',
): PreviewResult {
  const { answer, drawing, tallies, outlines, roles, region } = task.run(recipe, materials, onStage, extent)
  const { edges, openEdges, ...columns } = outlines
  return {
    answer,
    drawing: viewOf(drawing, tallies),
    outlines: { ...structuredClone(columns), edges: cut(edges), openEdges: cut(openEdges) },
    roles,
    placed: {
      block: outlines.source.map((row) => drawing.entities.block[row]),
      insert: outlines.source.map((row) => drawing.entities.insert[row]),
    },
    region: region && {
      edges: cut(region.edges),
      loopStart: region.loopStart.slice(),
      hole: region.hole.slice(),
      piece: region.piece.slice(),
      pieces: region.pieces,
    },
  }
}

function viewOf(drawing: TaskResult['drawing'], tallies: TaskResult['tallies']): DrawingView {
  const { edges: _edges, entities, remarks: _remarks, ...rest } = drawing
  return { ...rest, entities: entities.count, tallies }
}

function cut(edges: EdgeTable): EdgeTable {
  const { count, shapesUsed } = edges
  return {
    count,
    kind: edges.kind.slice(0, count),
    ends: edges.ends.slice(0, 4 * count),
    shape: edges.shape.slice(0, count),
    shapes: edges.shapes.slice(0, shapesUsed),
    shapesUsed,
    source: edges.source.slice(0, count),
  }
}

/** The buffers of a result, each once, to be handed over instead of copied. */
export function buffersOf({ outlines, region }: PreviewResult): ArrayBuffer[] {
  const tables = [outlines, outlines.edges, outlines.openEdges, ...(region ? [region, region.edges] : [])]
  const buffers = tables.flatMap((table) =>
    Object.values(table).flatMap((value: unknown) =>
      ArrayBuffer.isView(value) && value.buffer instanceof ArrayBuffer ? [value.buffer] : [],
    ),
  )
  return [...new Set(buffers)]
}
