import { profileNumber } from '@/db/counter'
import { database } from '@/db/instance'
import { letterOf } from '@/db/letter'
import { getStored } from '@/db/revisions'
import { attachment } from '@/lib/api/download'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { storedRegion } from '@/lib/api/storedRegion'
import { writeRegionDxf } from '@/lib/dxf/write'

/** The net metal as computed, in mm. */
export const GET = route({ permission: 'file.read', params: ById }, async ({ actor, params }) => {
  const { read } = database()
  const { number, position, regionBlobId } = await getStored(read, actor.teamId, params.id)
  const region = await storedRegion(read, regionBlobId)
  const name = `${profileNumber(number)}-${letterOf(position)}.dxf`
  return new Response(writeRegionDxf(region, { unit: 'mm' }), { headers: attachment(name, 'image/vnd.dxf') })
})
