import { execFile } from 'node:child_process'
import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { promisify } from 'node:util'
import SqliteDatabase from 'better-sqlite3'
import { type Kysely, type Migration, sql } from 'kysely'
import { afterEach, beforeEach, expect, test } from 'vitest'
import { checkFile, migrateFile } from '@/db/migrate'
import { MIGRATIONS } from '@/db/migrations'
import { bundleHere } from '@/tests/support/bundleHere'

let folder = ''
let file = ''
beforeEach(() => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'sectionwright-migrate-'))
  file = path.join(folder, 'a.sqlite')
})
afterEach(() => rmSync(folder, { recursive: true, force: true }))

const statement = (text: string): Migration => ({ up: async (db: Kysely<unknown>) => void (await sql.raw(text).execute(db)) })
const later = { ...MIGRATIONS, '9998-later': statement('create table later (id text)') }
const tables = () => {
  const connection = new SqliteDatabase(file, { readonly: true })
  const names = connection.prepare<[], { name: string }>("select name from sqlite_master where type = 'table'").all()
  connection.close()
  return names.map(({ name }) => name)
}

test('a new file gets every migration and no backup, a second start does nothing', async () => {
  expect(await migrateFile(file)).toEqual({ applied: Object.keys(MIGRATIONS), backup: null })
  expect(await migrateFile(file)).toEqual({ applied: [], backup: null })
  expect(tables()).toContain('revision')
})

test('before a file in use is changed, a sound copy of it is made', async () => {
  await migrateFile(file)
  const { applied, backup } = await migrateFile(file, { migrations: later })
  expect(applied).toEqual(['9998-later'])
  expect(backup && existsSync(backup)).toBe(true)
  if (backup) checkFile(backup)
  expect(readdirSync(path.join(folder, 'backups'))).toHaveLength(1)
})

test('an older build refuses a file that a newer one wrote', async () => {
  await migrateFile(file, { migrations: later })
  await expect(migrateFile(file)).rejects.toThrow(/newer version of Sectionwright \(9998-later\)/)
})

test('a migration that fails leaves nothing of itself and of those beside it', async () => {
  await migrateFile(file)
  const broken = { ...later, '9999-broken': statement('create table broken (id text, id text)') }
  await expect(migrateFile(file, { migrations: broken })).rejects.toThrow(/duplicate column/)
  expect(tables()).not.toContain('later')
  expect((await migrateFile(file, { migrations: later })).applied).toEqual(['9998-later'])
})

test('four processes that migrate one new file at once apply each step once', async () => {
  const child = await bundleHere('tests/db/migrate.child.ts')
  const outcomes = await Promise.all(Array.from({ length: 4 }, () => promisify(execFile)(process.execPath, [child, file])))
  expect(outcomes.flatMap(({ stdout }) => stdout.split(',').filter(Boolean))).toEqual(Object.keys(MIGRATIONS))
})

test('a copy with a row that refers to nothing is refused, and so is a file of something else', async () => {
  await migrateFile(file)
  const connection = new SqliteDatabase(file)
  connection.pragma('foreign_keys = OFF')
  connection.exec("insert into counter (team_id, noun, value) values ('nobody', 'job', 1)")
  connection.close()
  expect(() => checkFile(file)).toThrow(/is damaged/)
  const other = path.join(folder, 'other.sqlite')
  new SqliteDatabase(other).exec('create table mine (id text)').close()
  expect(() => checkFile(other)).toThrow(/no database of Sectionwright/)
})
