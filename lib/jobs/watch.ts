/** Cells of the memory that the computing thread shares with its watchdog; 0 means no limit. */
export const DEADLINE = 0
export const MEMORY = 1
export const CELLS = 2

export interface WatchData {
  cells: SharedArrayBuffer
  parent: number
}
