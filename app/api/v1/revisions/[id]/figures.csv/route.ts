import { z } from 'zod'
import { database } from '@/db/instance'
import { getProfile } from '@/db/profiles'
import { getRevision } from '@/db/revisions'
import { attachment } from '@/lib/api/download'
import { AppError } from '@/lib/api/errors'
import { route } from '@/lib/api/route'
import { ById } from '@/lib/api/schemas/common'
import { cautionsOf } from '@/lib/section/cautions'
import { figuresCsv } from '@/lib/section/csv'

const CsvQuery = z.object({
  separator: z.enum(['comma', 'semicolon']).default('comma'),
  bom: z.stringbool().default(false),
  unit: z.enum(['mm', 'cm', 'in']).default('mm'),
})

export const GET = route({ permission: 'profile.read', params: ById, query: CsvQuery }, async ({ actor, params, query }) => {
  const { read } = database()
  const { answer, letter, profileId, file, createdAt } = await getRevision(read, actor.teamId, params.id)
  const { number, title } = await getProfile(read, actor.teamId, profileId)
  if (!answer.section) throw new AppError('not_found')
  const csv = figuresCsv(answer.section, {
    separator: query.separator === 'comma' ? ',' : ';',
    bom: query.bom,
    units: { lengthUnit: query.unit },
    about: [
      ['profile', `${number} ${title}`],
      ['revision', letter],
      ['saved', createdAt],
      ['file', file.name],
      ['sha256', file.sha256],
      ['engine', answer.engineVersion],
      ...cautionsOf(answer.section, { shrinkage: answer.recipe.shrinkage ?? 1 }).map((caution) => ['caution', caution] as const),
    ],
  })
  return new Response(csv, { headers: attachment(`${number}-${letter}.csv`, 'text/csv; charset=utf-8') })
})
