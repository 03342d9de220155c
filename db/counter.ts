import { sql } from 'kysely'
import type { Trx } from './client'
import type { TeamId } from './id'

/** The next number for people of a noun in a team: 1, 2, 3 … without gaps, because it is taken in the transaction. */
export async function nextNumber(trx: Trx, teamId: TeamId, noun: 'job' | 'profile'): Promise<number> {
  const { value } = await trx
    .insertInto('counter')
    .values({ teamId, noun, value: 1 })
    .onConflict((conflict) => conflict.columns(['teamId', 'noun']).doUpdateSet({ value: sql<number>`counter.value + 1` }))
    .returning('value')
    .executeTakeFirstOrThrow()
  return value
}

const padded = (letter: string) => (number: number) => `${letter}-${String(number).padStart(4, '0')}`
export const jobNumber = padded('J')
export const profileNumber = padded('P')
