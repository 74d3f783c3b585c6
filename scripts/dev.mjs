import { join } from 'node:path'
import { environment, must, root, runBin, startAll } from './steps.mjs'

const port = Number(process.env.PORT ?? 3000)
const env = environment(join(root, 'data'), port, 2525)
must('Copying the PDF viewer', (await import('./copy-pdfjs.mjs')).copyPdfjs())
must('The migration', runBin('tsx', ['scripts/migrate.ts'], env))
startAll('dev', port, env)
