import { readFile } from 'node:fs/promises'
import { createRequire } from 'node:module'
import { promisify } from 'node:util'
import { gunzip } from 'node:zlib'

const require = createRequire(import.meta.url)

/** A recognised word: its box in pixels from the upper left corner, and the line it is part of. */
export type SeenWord = {
  text: string
  left: number
  top: number
  width: number
  height: number
  /** Block, paragraph and line; words of one line share it. */
  line: string
  /** In percent, as the recogniser trusts itself. */
  confidence: number
}

export type Recogniser = {
  /** Words of a grey picture of so many dots an inch, one byte a dot. */
  recognise: (grey: Uint8Array, width: number, height: number, dpi: number) => SeenWord[]
  close: () => void
}

/** What is used of the recogniser's WebAssembly module, which brings no types. */
type Core = {
  FS: { writeFile: (path: string, bytes: Uint8Array) => void }
  TessBaseAPI: new () => {
    Init: (path: null, language: string, mode: number) => number
    SetVariable: (name: string, value: string) => void
    SetImageFile: (orientation: number, angle: number) => number
    Recognize: (monitor: null) => number
    GetTSVText: (page: number) => string
    Clear: () => void
    End: () => void
  }
}

/** The engine that reads whole lines, the only one in this build. */
const lineReader = 1

/** Loads the recogniser and its language from the packages on this machine; nothing is fetched. */
export async function openRecogniser(): Promise<Recogniser> {
  const load = require('tesseract.js-core/tesseract-core-simd-lstm.js') as (
    options: Record<string, unknown>,
  ) => Promise<Core>
  const core = await load({ print: ignore, printErr: ignore })
  const language = await readFile(require.resolve('@tesseract.js-data/eng/4.0.0_best_int/eng.traineddata.gz'))
  core.FS.writeFile('eng.traineddata', await promisify(gunzip)(language))
  const api = new core.TessBaseAPI()
  if (api.Init(null, 'eng', lineReader) !== 0) throw new Error('the recogniser did not start')
  return {
    recognise(grey, width, height, dpi) {
      const head = new TextEncoder().encode(`P5\n${width} ${height}\n255\n`)
      const picture = new Uint8Array(head.length + grey.length)
      picture.set(head)
      picture.set(grey, head.length)
      core.FS.writeFile('/input', picture)
      // Columns and blocks are found by the recogniser; it wants to be told the resolution.
      api.SetVariable('tessedit_pageseg_mode', '3')
      api.SetVariable('user_defined_dpi', String(dpi))
      if (api.SetImageFile(1, 0) !== 0 || api.Recognize(null) !== 0) return []
      const words = readWords(api.GetTSVText(0))
      api.Clear()
      return words
    },
    close: () => api.End(),
  }
}

function ignore(): void {}

/** Rows of level 5 are words: level, page, block, paragraph, line, word, left, top, width, height, confidence, text. */
function readWords(rows: string): SeenWord[] {
  return rows.split('\n').flatMap((row) => {
    const cells = row.split('\t')
    const [level, , block, paragraph, line, , left, top, width, height, confidence] = cells
    const text = cells.slice(11).join(' ').trim()
    if (level !== '5' || text === '') return []
    return [
      {
        text,
        left: Number(left),
        top: Number(top),
        width: Number(width),
        height: Number(height),
        line: `${block}/${paragraph}/${line}`,
        confidence: Number(confidence),
      },
    ]
  })
}
