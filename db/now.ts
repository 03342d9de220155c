let clock = () => new Date()

/** The time, UTC with milliseconds. Everything that stores or compares a time asks here. */
export const now = () => clock().toISOString()
export const fromNow = (milliseconds: number) => new Date(clock().getTime() + milliseconds).toISOString()

/** Demo data and tests set the clock; without an argument it is the machine's again. */
export function setClock(next: () => Date = () => new Date()): void {
  clock = next
}
