import { must, runBin } from './steps.mjs'

must('Copying the PDF viewer', (await import('./copy-pdfjs.mjs')).copyPdfjs())
must('The build', runBin('next', ['build'], { NEXT_TELEMETRY_DISABLED: '1' }))
