import type { Finding } from '../geometry/finding'

/** Findings of one code that are listed; the rest are counted only. */
export const LISTED_PER_CODE = 2000

/** Collects findings: lists at most 2,000 of one code and counts all. */
export class FindingList {
  readonly items: Finding[] = []
  total = 0
  private readonly counts = new Map<string, number>()

  add(code: string, make: () => Finding): void {
    const count = (this.counts.get(code) ?? 0) + 1
    this.counts.set(code, count)
    this.total++
    if (count <= LISTED_PER_CODE) this.items.push(make())
  }

  has(code: string): boolean {
    return this.counts.has(code)
  }
}
