type Query = Record<string, string | number | boolean | null | undefined>

const V1 = '/api/v1'

/** The query string of what is set, in the order given; '' for nothing. */
function queryOf(query: Query = {}): string {
  const set = Object.entries(query).filter(([, value]) => value !== undefined && value !== null && value !== '')
  return set.length === 0 ? '' : `?${new URLSearchParams(set.map(([name, value]) => [name, String(value)]))}`
}

/** SWR keys: the paths of the API. */
export const keys = {
  setup: `${V1}/setup`,
  me: `${V1}/me`,
  team: `${V1}/team`,
  people: `${V1}/people`,
  person: (id: string) => `${V1}/people/${id}`,
  invitations: `${V1}/invitations`,
  invitation: (id: string) => `${V1}/invitations/${id}`,
  invitationLookup: (token: string) => `${V1}/invitations/lookup${queryOf({ token })}`,
  acceptInvitation: `${V1}/invitations/accept`,
  materials: `${V1}/materials`,
  material: (id: string) => `${V1}/materials/${id}`,
  jobs: (query?: Query) => `${V1}/jobs${queryOf(query)}`,
  job: (id: string) => `${V1}/jobs/${id}`,
  restoreJob: (id: string) => `${V1}/jobs/${id}/restore`,
  profiles: (query?: Query) => `${V1}/profiles${queryOf(query)}`,
  profile: (id: string) => `${V1}/profiles/${id}`,
  restoreProfile: (id: string) => `${V1}/profiles/${id}/restore`,
  revisions: (profileId: string) => `${V1}/profiles/${profileId}/revisions`,
  revision: (id: string) => `${V1}/revisions/${id}`,
  section: (id: string) => `${V1}/revisions/${id}/section`,
  region: (id: string) => `${V1}/revisions/${id}/region`,
  file: (id: string) => `${V1}/revisions/${id}/file`,
  regionDxf: (id: string) => `${V1}/revisions/${id}/region.dxf`,
  picture: (id: string) => `${V1}/revisions/${id}/picture.svg`,
  figuresCsv: (id: string) => `${V1}/revisions/${id}/figures.csv`,
  files: (sha256: string) => `${V1}/files${queryOf({ sha256 })}`,
  events: (query?: Query) => `${V1}/events${queryOf(query)}`,
  intakes: `${V1}/intakes`,
  demo: `${V1}/demo`,
}
