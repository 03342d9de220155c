import { afterAll, expect, test } from 'vitest'
import { setTimeout as wait } from 'node:timers/promises'
import { RevisionAdded } from '@/lib/api/schemas/revision'
import { random } from '@/tests/support/random'
import { rectanglesDxf } from '@/tests/support/rectanglesDxf'
import { inspect, WHOLE } from './inspect'
import { firstPerson, type Person } from './person'
import { aliveAfter, childrenOf } from './processes'
import { newDataDir, removeDataDir, type Server, startServer } from './server'

const KILLS = Number(process.env.CAMPAIGN_KILLS ?? 5)
const SEED = Number(process.env.CAMPAIGN_SEED ?? 20261201)
const dataDir = newDataDir()
afterAll(() => removeDataDir(dataDir))

interface Sent {
  key: string
  bytes: string
  area: number
  profileId: string
  /** what was acknowledged; null while it was not */
  revision: string | null
}

/** A different drawing each time: 600 rectangles of the same width, padded with comments to about `kib`. */
function drawing(n: number, kib: number): { bytes: string; area: number } {
  const width = 1 + n / 1000
  const rectangles = Array.from({ length: 600 }, (_, k): [number, number, number, number] => [
    10 * (k % 30),
    10 * Math.floor(k / 30),
    width,
    5,
  ])
  const padding = `999\n${'x'.repeat(200)}\n`.repeat(5 * kib)
  return { bytes: padding + rectanglesDxf(...rectangles), area: 600 * 5 * width }
}

async function send(me: Person, sent: Sent): Promise<boolean> {
  const answer = await me.upload(sent.profileId, sent.bytes, { key: sent.key }).catch(() => null)
  if (answer?.status !== 201) return false
  sent.revision = RevisionAdded.parse(answer.json).revision.id
  return true
}

/** As a browser does after the connection broke: the same request with the same key until it is answered. */
async function sendUntilAnswered(me: Person, sent: Sent): Promise<void> {
  for (let k = 0; k < 100; k++) {
    if (await send(me, sent)) return
    await wait(100)
  }
  throw new Error(`${sent.key} is not answered`)
}

test(
  `killed ${KILLS} times while it takes in and computes, the server keeps every acknowledged revision whole and once`,
  async () => {
    console.log(`seed ${SEED}`)
    const next = random(SEED)
    let server: Server = await startServer(dataDir)
    let me = await firstPerson(server.url)
    const profileId = await me.profile()
    const all: Sent[] = []
    for (let round = 0; round < KILLS; round++) {
      let alive = true
      const uploads = [0, 1].map(async (lane) => {
        while (alive) {
          const n = all.length
          const sent = {
            key: `key-${round}-${lane}-${n}`,
            ...drawing(n, Math.floor(4 * next()) * 256),
            profileId,
            revision: null,
          }
          all.push(sent)
          await send(me, sent)
        }
      })
      await wait(100 + 1200 * next())
      const children = childrenOf(server.pid)
      alive = false
      await server.stop('SIGKILL')
      await Promise.all(uploads)
      expect(await aliveAfter(children, 4), 'no child outlives its server').toEqual([])

      server = await startServer(dataDir)
      me = me.at(server.url)
      for (const sent of all.filter(({ revision }) => revision === null)) await sendUntilAnswered(me, sent)
    }
    for (const { revision, bytes, area } of all) {
      const { json } = await me.ask(`/revisions/${revision}/section`)
      expect(json).toMatchObject({ source: { bytes: bytes.length }, section: { pieces: 600 } })
      expect(Number(Object(json.section).area)).toBeWithin(area, { relative: 1e-9 })
      expect(Buffer.from(await me.bytes(`/revisions/${revision}/file`)).equals(Buffer.from(bytes))).toBe(true)
    }
    await server.stop()
    expect(all.length).toBeGreaterThan(KILLS)
    expect(new Set(all.map(({ revision }) => revision)).size).toBe(all.length)
    const counts = { revisions: all.length, sections: all.length, events: all.length }
    expect(inspect(dataDir)).toMatchObject({ ...WHOLE, ...counts })
  },
  60_000 + 30_000 * KILLS,
)
