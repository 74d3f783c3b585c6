import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'
import { expect, test } from 'vitest'

const root = resolve(import.meta.dirname, '..')

/** Who may import whom. A file belongs to the longest place that its path starts with. */
const arrows: Record<string, readonly string[]> = {
  'lib/checks': [],
  'lib/rules': ['lib/checks'],
  'lib/letters': ['lib/checks', 'lib/rules'],
  'lib/settings': [],
  'db/schema': ['lib/rules', 'lib/checks'],
  db: ['db/schema', 'lib/rules', 'lib/checks', 'lib/settings'],
  'db/queries': ['db', 'db/schema', 'lib/rules', 'lib/checks', 'lib/settings'],
  'lib/record': ['db', 'db/schema', 'db/queries', 'lib/rules'],
  'lib/intake': ['lib/checks', 'lib/rules', 'lib/settings'],
  'lib/mail': [
    'db',
    'db/schema',
    'db/queries',
    'lib/rules',
    'lib/letters',
    'lib/jobs',
    'lib/record',
    'lib/settings',
  ],
  'lib/jobs': [
    'db',
    'db/schema',
    'db/queries',
    'lib/checks',
    'lib/rules',
    'lib/intake',
    'lib/letters',
    'lib/record',
    'lib/desk',
    'lib/mail',
    'lib/settings',
    'lib/log',
  ],
  'lib/desk': [
    'db',
    'db/schema',
    'db/queries',
    'lib/checks',
    'lib/rules',
    'lib/intake',
    'lib/letters',
    'lib/record',
    'lib/mail',
    'lib/jobs',
    'lib/settings',
  ],
  'lib/web': [
    'db',
    'db/schema',
    'db/queries',
    'lib/rules',
    'lib/desk',
    'lib/intake',
    'lib/mail',
    'lib/checks',
    'lib/settings',
    'lib/log',
  ],
  'lib/log': ['lib/settings'],
  components: ['lib/checks', 'lib/rules', 'db/queries'],
  app: [
    'components',
    'lib/web',
    'lib/desk',
    'lib/letters',
    'lib/mail',
    'lib/intake',
    'lib/rules',
    'lib/checks',
    'lib/settings',
    'db',
    'db/queries',
  ],
}

const places = Object.keys(arrows).sort((a, b) => b.length - a.length)
const placeOf = (path: string) =>
  places.find((p) => path === p || path.startsWith(`${p}/`) || path.startsWith(`${p}.`))

type Import = { file: string; target: string; typeOnly: boolean }

const sources = ['app', 'components', 'db', 'lib'].flatMap((folder) =>
  readdirSync(join(root, folder), { recursive: true, encoding: 'utf8' })
    .map((file) => join(folder, file))
    .filter((file) => /\.tsx?$/.test(file)),
)

const imports: Import[] = sources.flatMap((file) =>
  // `import x from 'y'`, `export * from 'y'`, `import 'y'`, over several lines too
  [
    ...readFileSync(join(root, file), 'utf8').matchAll(
      /^(import|export)\s+(type\s+)?(?:[^'"]*?from\s+)?['"]([^'"]+)['"]/gms,
    ),
  ].map((match) => ({ file, target: match[3] ?? '', typeOnly: match[2] !== undefined })),
)

function inProject({ file, target }: Import): string | null {
  if (target.startsWith('@/')) return target.slice(2)
  if (target.startsWith('.')) return relative(root, resolve(root, dirname(file), target))
  return null
}

test('the reader of import lines finds them', () => {
  expect(imports.length).toBeGreaterThan(100)
})

test('every import follows the table of arrows', () => {
  const against = imports.flatMap((one) => {
    const target = inProject(one)
    const from = placeOf(one.file)
    const to = target === null ? undefined : placeOf(target)
    if (target === null || !from || from === to || (to && arrows[from]?.includes(to))) return []
    return [`${one.file} → ${target}`]
  })
  expect(against).toEqual([])
})

test('components take only types from the queries, so that no SQL reaches the browser', () => {
  const against = imports.filter(
    (one) => one.file.startsWith('components/') && inProject(one)?.startsWith('db/') && !one.typeOnly,
  )
  expect(against).toEqual([])
})

test('only app, lib/web and the components import Next.js', () => {
  const against = imports.filter(
    (one) => /^next(\/|-auth|$)/.test(one.target) && !/^(app|lib\/web|components)\//.test(one.file),
  )
  expect(against).toEqual([])
})

test('the engine imports nothing but itself and pure computation', () => {
  const against = imports.filter(
    (one) =>
      one.file.startsWith('lib/checks/') &&
      !one.target.startsWith('.') &&
      !/^(simple-statistics|@stdlib\/)/.test(one.target),
  )
  expect(against).toEqual([])
})
