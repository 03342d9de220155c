import type { PlusMinus } from '@/lib/section/types'

export interface Contribution {
  word: string
  value: number
}

const WORDS: [keyof PlusMinus, string][] = [
  ['digits', "the drawing's last digit"],
  ['repairs', 'closed gaps'],
  ['numerics', 'the numerics'],
]

/** The three ± of a figure, largest first; what contributes nothing is left out. */
export function contributions(plusMinus: PlusMinus | undefined): Contribution[] {
  return WORDS.flatMap(([key, word]) => {
    const value = plusMinus?.[key] ?? 0
    return value > 0 ? [{ word, value }] : []
  }).sort((a, b) => b.value - a.value)
}

/** All three together: they may all pull the same way. */
export const totalPlusMinus = (plusMinus: PlusMinus | undefined): number =>
  contributions(plusMinus).reduce((sum, { value }) => sum + value, 0)
