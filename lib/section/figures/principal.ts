import type { Figure } from './figure'
import { momentSpread, thetaSpread } from './spread'

/**
 * I1 ≥ I2, integrated in the principal frame itself: from Ix, Iy, Ixy alone a thin turned strip would lose I2's digits.
 * Source: Timoshenko, Strength of Materials I (from memory).
 */
export const i1: Figure = {
  key: 'i1',
  group: 'principal',
  symbol: { en: { base: 'I', sub: '1' }, us: { base: 'I', sub: '1' } },
  word: 'second moment about axis 1 (major)',
  dimension: 'secondMoment',
  origin: 'exact',
  shows: 'axis1',
  value: (section) => section.i1,
  spread: (section, change) => momentSpread(section, change, 'axis1'),
}

export const i2: Figure = {
  ...i1,
  key: 'i2',
  symbol: { en: { base: 'I', sub: '2' }, us: { base: 'I', sub: '2' } },
  word: 'second moment about axis 2 (minor)',
  shows: 'axis2',
  value: (section) => section.i2,
  spread: (section, change) => momentSpread(section, change, 'axis2'),
}

/** θ = ½·atan2(−2Ixy, Ix − Iy), counter-clockwise from +x to axis 1, in (−90°, 90°]; null where every axis is principal. */
export const theta: Figure = {
  key: 'theta',
  group: 'principal',
  symbol: { en: { base: 'θ' }, us: { base: 'θ' } },
  word: 'angle from x to axis 1, counter-clockwise',
  dimension: 'angle',
  origin: 'exact',
  shows: 'axes12',
  value: (section) => section.theta,
  spread: thetaSpread,
}
