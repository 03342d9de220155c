'use client'
import { problemOf } from '@/components/ui/problem'
import { toast } from '@/components/ui/toastStore'
import * as data from './data'

interface Named {
  id: string
  number: string
  version: number
}

async function saying(work: () => Promise<void>): Promise<void> {
  try {
    await work()
  } catch (error) {
    toast(problemOf(error).sentence, { tone: 'error' })
  }
}

/** Deleting is to a bin, and each step offers its undo. */
export function useBinning() {
  const restoreJob = ({ id, number }: Named) =>
    saying(async () => {
      await data.restoreJob(id)
      toast(`${number} is restored.`)
    })
  const restoreProfile = ({ id, number }: Named) =>
    saying(async () => {
      await data.restoreProfile(id)
      toast(`${number} is restored.`)
    })
  const binJob = (job: Named) =>
    saying(async () => {
      await data.binJob(job)
      toast(`${job.number} is in the bin.`, { undo: () => restoreJob(job) })
    })
  const binProfile = (profile: Named) =>
    saying(async () => {
      await data.binProfile(profile)
      toast(`${profile.number} is in the bin.`, { undo: () => restoreProfile(profile) })
    })
  return { binJob, restoreJob, binProfile, restoreProfile }
}
