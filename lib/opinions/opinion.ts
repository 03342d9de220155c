/** What another library says of the same file or region. `agrees` is null where it was not asked; the sentence says why. */
export interface Opinion {
  library: string
  agrees: boolean | null
  sentence: string
}
