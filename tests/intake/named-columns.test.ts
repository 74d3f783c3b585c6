import { writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { defaultHouseRules, type NamedColumn } from '@/lib/checks'
import { auditFiles } from '@/lib/intake/audit-files'
import { makeFolder } from '../support/folder'
import { makePdf } from '../support/pdf'

test('the audit reads a column as it was named', async () => {
  const folder = makeFolder()
  const [manuscript, path] = [join(folder, 'paper.pdf'), join(folder, 'results.csv')]
  writeFileSync(manuscript, await makePdf())
  writeFileSync(path, 'Comparison,t,df,score\nA vs B,2.10,22,0.047\nA vs C,3.05,22,0.006\n')
  const scales = async (roles: NamedColumn[]) => {
    const { audit } = await auditFiles({
      manuscript,
      table: { path, name: 'results.csv', roles },
      rules: defaultHouseRules,
    })
    return audit.reports.filter(({ place }) => place.source === 'results-table').map(({ scale }) => scale)
  }
  expect(await scales([])).toEqual([])
  expect(await scales([{ sheet: 0, row: 0, column: 3, role: 'p-adjusted' }])).toEqual([
    'adjusted',
    'adjusted',
  ])
})
