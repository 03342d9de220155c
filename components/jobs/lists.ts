import type { ListDefaults } from '@/components/lists/listPath'

/** How each list begins; page and browser ask alike. */
export const JOB_LIST: ListDefaults = { sort: 'updatedAt', dir: 'desc' }
export const PROFILE_LIST: ListDefaults = { sort: 'updatedAt', dir: 'desc' }
export const jobProfiles = (jobId: string): ListDefaults => ({ sort: 'number', dir: 'asc', fixed: { jobId } })

/** Every job, newest first, as a form offers them. */
export const ALL_JOBS = { sort: 'number', dir: 'desc', limit: 200 }
