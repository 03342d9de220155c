import { notFound } from 'next/navigation'
import { isAppError } from '@/lib/api/errors'

/** The row, or the page that says there is nothing here. */
export async function orNotFound<T>(row: Promise<T>): Promise<T> {
  try {
    return await row
  } catch (error) {
    if (isAppError(error) && error.code === 'not_found') notFound()
    throw error
  }
}
