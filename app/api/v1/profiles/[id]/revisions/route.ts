import { database } from '@/db/instance'
import { getProfile } from '@/db/profiles'
import { getRevision, listRevisions } from '@/db/revisions'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { upload } from '@/lib/jobs/upload'

export const GET = route({ permission: 'profile.read', params: ById }, async ({ actor, params }) => {
  await getProfile(database().read, actor.teamId, params.id)
  return { items: await listRevisions(database().read, actor.teamId, params.id) }
})

export const POST = route(
  { permission: 'revision.add', params: ById, status: 201 },
  async ({ actor, params, request, requestId }) => {
    const id = await upload(actor, params.id, request, requestId)
    const revision = await getRevision(database().read, actor.teamId, id)
    return { revision, section: revision.answer.section, findings: revision.answer.findings }
  },
)
