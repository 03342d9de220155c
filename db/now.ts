import { AsyncLocalStorage } from 'node:async_hooks'

type Clock = () => Date

let clock: Clock = () => new Date()
const ownClock = new AsyncLocalStorage<Clock>()
const time = () => (ownClock.getStore() ?? clock)()

/** The time, UTC with milliseconds. Everything that stores or compares a time asks here. */
export const now = () => time().toISOString()
export const fromNow = (milliseconds: number) => new Date(time().getTime() + milliseconds).toISOString()

/** Tests set the clock; without an argument it is the machine's again. */
export function setClock(next: Clock = () => new Date()): void {
  clock = next
}

/** Work that happens at a time of its own (the demo's story), while everybody else's goes on. */
export const withClock = <T>(own: Clock, work: () => Promise<T>): Promise<T> => ownClock.run(own, work)
