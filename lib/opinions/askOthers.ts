import type { Drawing } from '../dxf/drawing'
import type { Combination } from './combination'
import { dxfParserOpinion } from './dxfParser'
import { flattenOpinion } from './flatten'
import type { Opinion } from './opinion'
import { polygonClippingOpinion } from './polygonClipping'

/** All second opinions on one file and what the engine made of it; without a section only the reading is compared. */
export function askOthers(bytes: Uint8Array, drawing: Drawing, combination: Combination | null): Opinion[] {
  const opinions = [dxfParserOpinion(bytes, drawing)]
  if (combination) opinions.push(flattenOpinion(combination), polygonClippingOpinion(combination))
  return opinions
}
