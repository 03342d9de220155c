import { expect, test } from 'vitest'
import { readConfig } from '@/lib/config'

test('without settings the server is for this machine only, on port 3000, with 64 MiB a file and 30 s a computation', () => {
  expect(readConfig({})).toMatchObject({
    port: 3000,
    host: '127.0.0.1',
    local: true,
    appUrl: 'http://localhost:3000',
    secure: false,
    trustProxy: false,
    maxFileBytes: 67_108_864,
    computeSeconds: 30,
  })
})

test('an https address makes the cookies secure, an empty setting is none', () => {
  const config = readConfig({ APP_URL: 'https://sections.example.org/', HOST: '0.0.0.0', PORT: '', TRUST_PROXY: 'true' })
  expect(config).toMatchObject({
    appUrl: 'https://sections.example.org',
    secure: true,
    local: false,
    port: 3000,
    trustProxy: true,
  })
})

test('a setting that cannot be used is named', () => {
  expect(() => readConfig({ PORT: 'http' })).toThrow(/The environment cannot be used\.\n.*PORT/s)
})
