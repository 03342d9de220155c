import { pictureSvg } from '@/components/picture/pictureSvg'
import { writingOf } from '@/components/sheet/writing'
import { database } from '@/db/instance'
import { getProfile } from '@/db/profiles'
import { getRevision, getStored } from '@/db/revisions'
import { getTeam } from '@/db/teams'
import { attachment } from '@/lib/api/download'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { storedRegion } from '@/lib/api/storedRegion'
import { DEFAULT_RECIPE } from '@/lib/geometry/recipe'
import { typefaces } from './typefaces'

export const GET = route({ permission: 'profile.read', params: ById }, async ({ actor, params }) => {
  const { read } = database()
  const { teamId } = actor
  const { answer, letter, state, profileId } = await getRevision(read, teamId, params.id)
  const [{ number, title }, { settings }, { regionBlobId }] = [
    await getProfile(read, teamId, profileId),
    await getTeam(read, teamId),
    await getStored(read, teamId, params.id),
  ]
  const region = await storedRegion(read, regionBlobId)
  const recipe = { ...DEFAULT_RECIPE, ...answer.recipe }
  const options = { number, title, letter, state, writing: writingOf(settings), faces: await typefaces() }
  const svg = pictureSvg({ ...answer, recipe }, region, options)
  return new Response(svg, { headers: attachment(`${number}-${letter}.svg`, 'image/svg+xml') })
})
