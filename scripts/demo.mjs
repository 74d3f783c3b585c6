import { join } from 'node:path'
import {
  checkNode,
  environment,
  install,
  must,
  root,
  run,
  runBin,
  say,
  startAll,
  untilHealthy,
} from './steps.mjs'

checkNode()
const port = Number(process.env.PORT ?? 3000)
const folder = join(root, 'data', 'demo')
const env = environment(folder, port, 2525)

say('1 of 4  Installing packages')
must('npm ci', install())
say('2 of 4  Preparing the database and the demonstration')
must('The migration', runBin('tsx', ['scripts/migrate.ts'], env))
must('The demonstration', runBin('tsx', ['scripts/seed.ts'], env))
say('3 of 4  Building')
must('The build', run(process.execPath, ['scripts/build.mjs'], env))
say('4 of 4  Starting')
startAll('start', port, env)
if (!(await untilHealthy(port))) {
  console.error('The server does not answer; see the lines above.')
  process.exit(1)
}
must('The list of accounts', runBin('tsx', ['scripts/seed.ts', '--accounts'], env))
