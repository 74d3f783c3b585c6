import { randomBytes } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { parseArgs } from 'node:util'
import { eq } from 'drizzle-orm'
import { openDb, transact, type Db } from '@/db/client'
import { newId } from '@/db/ids'
import { manuscripts, people as peopleTable, personRoles } from '@/db/schema'
import { hashPassword } from '@/lib/desk/password'
import { runDueJobs } from '@/lib/jobs/run-due-jobs'
import type { Actor } from '@/lib/rules/roles'
import { getSettings } from '@/lib/settings'
import { people, type PersonKey } from './demo/people'
import { tellAll } from './demo/tell-all'

const { values } = parseArgs({
  options: { accounts: { type: 'boolean' }, 'people-only': { type: 'boolean' } },
})
const settings = getSettings()

if (values.accounts) printAccounts()
else await seed()

async function seed(): Promise<void> {
  const db = openDb(settings.database)
  if (db.select({ id: peopleTable.id }).from(peopleTable).limit(1).get()) {
    console.log('The database has people already; nothing was added.')
    return
  }
  const who = await addPeople(db, getPassword())
  if (values['people-only']) return
  const audit = (at: number) => runDueJobs(db, settings, 'run-audit', () => at)
  await tellAll({ db, uploads: settings.uploads, audit }, who, Date.now())
  const count = db.select({ state: manuscripts.state }).from(manuscripts).all()
  console.log(`Added ${people.length} people and ${count.length} manuscripts.`)
}

async function addPeople(db: Db, password: string): Promise<Record<PersonKey, Actor>> {
  const passwordHash = await hashPassword(password)
  const now = Date.now()
  const add = (person: (typeof people)[number]): Actor =>
    transact(db, (tx) => {
      const id = newId('person')
      const { email, name, affiliation, expertise } = person
      tx.insert(peopleTable)
        .values({ id, email, name, affiliation, expertise, status: 'active', passwordHash, createdAt: now })
        .run()
      for (const role of person.roles) tx.insert(personRoles).values({ personId: id, role }).run()
      return { kind: 'person', id, name, email, roles: person.roles, sessionId: null }
    })
  return Object.fromEntries(people.map((person) => [person.key, add(person)])) as Record<PersonKey, Actor>
}

/** One password for all accounts of a demonstration, made once and kept beside its data. */
function getPassword(): string {
  if (process.env.ASSIZE_DEMO_PASSWORD) return process.env.ASSIZE_DEMO_PASSWORD
  const path = join(dirname(settings.database), 'demo-password')
  if (!existsSync(path)) writeFileSync(path, `tern-${randomBytes(6).toString('hex')}`, { mode: 0o600 })
  return readFileSync(path, 'utf8')
}

function printAccounts(): void {
  const db = openDb(settings.database)
  const known = (email: string) => db.select().from(peopleTable).where(eq(peopleTable.email, email)).get()
  const rows = people.filter((person) => known(person.email))
  console.log(
    [
      '',
      `Assize is running on ${settings.url}`,
      '',
      'Sign in as one of these, all with the password  ' + getPassword(),
      ...rows.map((person) => `  ${person.email.padEnd(40)} ${person.roles.join(' and ')}`),
      '',
      'Mail that is sent goes to a local fake; the administrator reads it under Mailbox. Stop with Ctrl-C.',
      '',
    ].join('\n'),
  )
}
