import { readFileSync } from 'node:fs'
import path from 'node:path'
import { expect, type Page } from '@playwright/test'
import { fresh } from './door'

/** A job with one profile saved through the API, by whoever is signed in; the paths of both. */
export async function savedProfile(page: Page, drawing: string): Promise<{ job: string; profile: string }> {
  const headers = { origin: new URL(page.url()).origin }
  const job = await (await page.request.post('/api/v1/jobs', { headers, data: { title: fresh('North face') } })).json()
  const profile = await (
    await page.request.post('/api/v1/profiles', { headers, data: { jobId: job.id, title: fresh('Profile') } })
  ).json()
  const name = path.basename(drawing)
  const saved = await page.request.post(`/api/v1/profiles/${profile.id}/revisions`, {
    headers: { ...headers, 'idempotency-key': `things-${profile.id}` },
    multipart: {
      recipe: JSON.stringify({ unit: 'mm' }),
      fields: JSON.stringify({}),
      file: { name, mimeType: 'application/dxf', buffer: readFileSync(path.resolve(drawing)) },
    },
  })
  expect(saved.status()).toBe(201)
  return { job: `/jobs/${job.id}`, profile: `/profiles/${profile.id}` }
}
