/** What a person may be in a team; several at once. `administrator` is a right beside the roles. */
export const ROLES = ['designer', 'fabricator', 'engineer', 'viewer'] as const
export type Role = (typeof ROLES)[number]

type Holder = Role | 'administrator'
const EVERYONE: readonly Holder[] = [...ROLES, 'administrator']

/** Who may do what. The wrapper of the routes and the buttons ask the same table through `can`. */
export const PERMISSIONS = {
  'team.read': { allows: 'see the team, its people and settings', holders: EVERYONE },
  'team.settings': { allows: 'change units, symbols and axis names of the team', holders: ['administrator'] },
  'people.manage': { allows: 'invite, change roles, disable', holders: ['administrator'] },
  'material.read': { allows: 'see materials', holders: EVERYONE },
  'material.edit': { allows: 'add and change materials', holders: ['administrator', 'engineer'] },
  'job.read': { allows: 'see jobs', holders: EVERYONE },
  'job.edit': { allows: 'open, rename and bin jobs', holders: ['designer', 'engineer', 'administrator'] },
  'profile.read': { allows: 'see profiles, revisions and sections', holders: EVERYONE },
  'profile.edit': { allows: 'add, rename and bin profiles', holders: ['designer', 'administrator'] },
  'revision.add': { allows: 'upload a drawing and save its section', holders: ['designer', 'administrator'] },
  'file.read': { allows: 'download source files and clean regions', holders: EVERYONE },
  'demo.load': { allows: 'load the demo data', holders: ['administrator'] },
  'event.read': { allows: 'see the history', holders: EVERYONE },
} as const satisfies Record<string, { allows: string; holders: readonly Holder[] }>

export type Permission = keyof typeof PERMISSIONS

/** What `can` needs to know of a person. */
export interface Holding {
  roles: readonly Role[]
  administrator: boolean
}

/** May this person do this? The one place that answers it. */
export function can(person: Holding, permission: Permission): boolean {
  const holders: readonly Holder[] = PERMISSIONS[permission].holders
  return (person.administrator && holders.includes('administrator')) || person.roles.some((role) => holders.includes(role))
}
