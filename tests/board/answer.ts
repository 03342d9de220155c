import { DEFAULT_RECIPE, type Recipe, type XY } from '@/lib/geometry/recipe'
import type { Region } from '@/lib/geometry/region'
import { ENGINE_VERSION } from '@/lib/section/engineVersion'
import { sectionOf } from '@/lib/section/section'
import type { SectionAnswer } from '@/lib/section/types'

/** An answer of the engine for a region, with these outlines and no findings. */
export function answerWith(region: Region, outlines: { id: string; at: XY }[] = [], recipe: Partial<Recipe> = {}): SectionAnswer {
  const { section, findings } = sectionOf(region, { lastDigit: 5e-7, repairs: [] })
  return {
    engineVersion: ENGINE_VERSION,
    source: { name: 'plate.dxf', bytes: 1200, sha256: 'ab'.repeat(32) },
    recipe: { ...DEFAULT_RECIPE, ...recipe },
    unit: { drawing: 'mm', mmPerUnit: 1, declared: 'mm' },
    outlines: outlines.map(({ id, at }, depth) => ({ id, at, layer: '0', edges: 4, area: 2400, depth })),
    outlinesTotal: outlines.length,
    findings,
    findingsTotal: findings.length,
    section,
  }
}
