import { z } from 'zod'
import { Job } from '@/lib/api/schemas/job'
import { Profile } from '@/lib/api/schemas/profile'

const Json = z.record(z.string(), z.unknown())

export interface Answer {
  status: number
  json: Record<string, unknown>
}

interface Sending {
  name?: string
  key?: string
  signal?: AbortSignal
}

/** Somebody with a browser at the server: a session and requests as our pages make them. */
export class Person {
  constructor(
    private readonly url: string,
    readonly cookie: string,
  ) {}

  /** The same person after a restart, which may be on another port. */
  at(url: string): Person {
    return new Person(url, this.cookie)
  }

  async ask(path: string, init: RequestInit = {}): Promise<Answer> {
    const headers = new Headers({ cookie: this.cookie, origin: this.url, ...Object.fromEntries(new Headers(init.headers)) })
    const response = await fetch(`${this.url}/api/v1${path}`, { ...init, headers })
    const text = await response.text()
    return { status: response.status, json: text.startsWith('{') ? Json.parse(JSON.parse(text)) : {} }
  }

  async bytes(path: string): Promise<Uint8Array> {
    const response = await fetch(`${this.url}/api/v1${path}`, { headers: { cookie: this.cookie } })
    return new Uint8Array(await response.arrayBuffer())
  }

  post(path: string, body: object): Promise<Answer> {
    return this.ask(path, { method: 'POST', body: JSON.stringify(body), headers: { 'content-type': 'application/json' } })
  }

  upload(
    profileId: string,
    bytes: Uint8Array<ArrayBuffer> | string,
    { name = 'a.dxf', key = '', signal }: Sending = {},
  ): Promise<Answer> {
    const body = new FormData()
    body.set('file', new File([bytes], name))
    const headers: Record<string, string> = key ? { 'idempotency-key': key } : {}
    return this.ask(`/profiles/${profileId}/revisions`, { method: 'POST', body, headers, signal })
  }

  async profile(): Promise<string> {
    const job = Job.parse((await this.post('/jobs', { title: 'Job' })).json)
    return Profile.parse((await this.post('/profiles', { jobId: job.id, title: 'Profile' })).json).id
  }
}

/** Sets a new server up and is its administrator. */
export async function firstPerson(url: string): Promise<Person> {
  const body = JSON.stringify({ team: 'Team', name: 'Ann', email: 'ann@example.org', password: 'long enough' })
  const response = await fetch(`${url}/api/v1/setup`, { method: 'POST', body })
  const cookie = response.headers.get('set-cookie')?.split(';')[0]
  if (response.status !== 201 || !cookie) throw new Error(`Setting up answered ${response.status}: ${await response.text()}`)
  return new Person(url, cookie)
}
