import { rmSync } from 'node:fs'
import { join } from 'node:path'
import { environment, must, root, runBin, startAll } from './steps.mjs'

// A fresh installation with the demonstration in it, for the end-to-end tests.
const port = Number(process.env.ASSIZE_E2E_PORT ?? 3999)
const folder = join(root, '.demo', 'e2e')
rmSync(folder, { recursive: true, force: true })
const env = environment(folder, port, 2526)
must('The migration', runBin('tsx', ['scripts/migrate.ts'], env))
must(
  'The demonstration',
  runBin('tsx', ['scripts/seed.ts'], { ...env, ASSIZE_DEMO_PASSWORD: 'end-to-end-only' }),
)
startAll('start', port, env)
