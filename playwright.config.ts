import { existsSync, mkdtempSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { defineConfig, devices } from '@playwright/test'

const PORT = Number(process.env.E2E_PORT ?? 3310)
// workers read this file again: the folder is made once, by the first process
process.env.E2E_DATA_DIR ??= mkdtempSync(path.join(os.tmpdir(), 'sectionwright-e2e-'))
const browsers = [process.env.CHROMIUM ?? '', '/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome']

export default defineConfig({
  testDir: 'tests/e2e',
  outputDir: 'test-results',
  workers: 1,
  timeout: 60_000,
  // a machine that stumbles does not hold up a landing; a flaky test is printed as such and is a defect
  retries: process.env.CI ? 1 : 0,
  use: {
    ...devices['Desktop Chrome'],
    viewport: { width: 1440, height: 900 },
    baseURL: `http://localhost:${PORT}`,
    trace: 'retain-on-failure',
    launchOptions: {
      executablePath: browsers.find((file) => file !== '' && existsSync(file)),
      args: [
        '--headless',
        '--no-sandbox',
        '--disable-gpu',
        '--disable-quic',
        '--no-first-run',
        '--disable-background-networking',
        '--disable-component-update',
        '--disable-sync',
      ],
    },
  },
  webServer: {
    command: 'node scripts/serve.mjs',
    url: `http://localhost:${PORT}/api/health`,
    timeout: 60_000,
    reuseExistingServer: false,
    env: {
      PORT: String(PORT),
      HOST: '127.0.0.1',
      DATA_DIR: process.env.E2E_DATA_DIR,
      LOG_LEVEL: 'warn',
      SIGN_IN_ATTEMPTS: '1000',
      ...(process.env.NEXT_DIST ? { NEXT_DIST: process.env.NEXT_DIST } : {}),
    },
  },
})
