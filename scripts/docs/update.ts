import { readFileSync, writeFileSync } from 'node:fs'
import { insertAccessTable } from './access-table'

writeFileSync('DEVELOPERS.md', insertAccessTable(readFileSync('DEVELOPERS.md', 'utf8')))
