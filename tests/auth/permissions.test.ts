import { expect, test } from 'vitest'
import { can, PERMISSIONS, type Permission, ROLES } from '@/lib/auth/permissions'

/** d designer, f fabricator, e engineer, v viewer, a administrator without a role */
const EXPECTED: Record<Permission, string> = {
  'team.read': 'dfeva',
  'team.settings': 'a',
  'people.manage': 'a',
  'material.read': 'dfeva',
  'material.edit': 'ea',
  'job.read': 'dfeva',
  'job.edit': 'dea',
  'profile.read': 'dfeva',
  'profile.edit': 'da',
  'revision.add': 'da',
  'file.read': 'dfeva',
  'demo.load': 'a',
  'event.read': 'dfeva',
}

const isPermission = (name: string): name is Permission => name in PERMISSIONS

test('who may do what stands row by row as written here', () => {
  expect(Object.keys(PERMISSIONS).sort()).toEqual(Object.keys(EXPECTED).sort())
  for (const permission of Object.keys(PERMISSIONS).filter(isPermission)) {
    const holders = ROLES.filter((role) => can({ roles: [role], administrator: false }, permission)).map((role) => role[0])
    const administrator = can({ roles: [], administrator: true }, permission) ? ['a'] : []
    expect([...holders, ...administrator].join(''), permission).toBe(EXPECTED[permission])
  }
})

test('several roles give what each gives, and nobody without a role or the right may do anything', () => {
  expect(can({ roles: ['viewer', 'engineer'], administrator: false }, 'job.edit')).toBe(true)
  for (const permission of Object.keys(PERMISSIONS).filter(isPermission)) {
    expect(can({ roles: [], administrator: false }, permission)).toBe(false)
  }
})
