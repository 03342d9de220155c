import type { Figure } from './figure'
import { momentSpread } from './spread'

/** Ix = ∫y² dA about the horizontal axis through the centroid. A boundary that moves out by δ adds δ∮y² ds. */
export const ix: Figure = {
  key: 'ix',
  group: 'bending',
  symbol: { en: { base: 'I', sub: 'x' }, us: { base: 'I', sub: 'x' } },
  word: 'second moment about x',
  dimension: 'secondMoment',
  origin: 'exact',
  shows: 'axisX',
  value: (section) => section.ix,
  spread: (section, change) => momentSpread(section, change, 'x'),
}

/** Iy = ∫x² dA about the vertical axis through the centroid. */
export const iy: Figure = {
  ...ix,
  key: 'iy',
  symbol: { en: { base: 'I', sub: 'y' }, us: { base: 'I', sub: 'y' } },
  word: 'second moment about y',
  shows: 'axisY',
  value: (section) => section.iy,
  spread: (section, change) => momentSpread(section, change, 'y'),
}

/** Ixy = +∫xy dA about the centroid: positive where the metal lies up right and down left. */
export const ixy: Figure = {
  ...ix,
  key: 'ixy',
  symbol: { en: { base: 'I', sub: 'xy' }, us: { base: 'I', sub: 'xy' } },
  word: 'product of area, +∫xy dA',
  shows: 'axesXY',
  value: (section) => section.ixy,
  spread: (section, change) => Math.sqrt(change.xx * change.yy) + change.relative * section.ip,
}

/** Ip = Ix + Iy = ∫r² dA about the centroid; not the torsion constant. */
export const ip: Figure = {
  ...ix,
  key: 'ip',
  symbol: { en: { base: 'I', sub: 'p' }, us: { base: 'I', sub: 'p' } },
  word: 'polar second moment',
  shows: 'centroid',
  value: (section) => section.ip,
  spread: (section, change) => change.xx + change.yy + change.relative * section.ip,
}
