import { mmPerUnit, type Recipe } from '@/lib/geometry/recipe'
import type { DrawingView } from '@/lib/jobs/browser-pool'
import { UNITS } from './size'

/** The unit that the file declares, as a recipe gives it; null where it declares none and millimetres are as good a start. */
export function startUnit({ declaredMm, measurement }: Pick<DrawingView, 'declaredMm' | 'measurement'>): Recipe['unit'] | null {
  if (declaredMm === null) return measurement === 'english' ? 'in' : null
  return UNITS.find((unit) => mmPerUnit({ unit, scale: 1, shrinkage: 1 }) === declaredMm) ?? declaredMm
}
