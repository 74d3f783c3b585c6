import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { checkNode, install, root, run, runBin, say } from './steps.mjs'

// Every step runs even when an earlier one failed, so that one run tells all; only a failed install ends it.
checkNode()
const out = join(root, 'test-results')
const unitReport = join(out, 'unit.json')
const e2eReport = join(out, 'e2e.json')
rmSync(out, { recursive: true, force: true })
mkdirSync(out, { recursive: true })

const quiet = { DEBIAN_FRONTEND: 'noninteractive' }
const counts = { passed: 0, failed: 0 }
const failures = []

function step(name, work) {
  say(`\n=== ${name}`)
  const started = Date.now()
  const status = work()
  say(`=== ${name}: ${status === 0 ? 'passed' : 'FAILED'} (${Math.round((Date.now() - started) / 1000)} s)`)
  counts[status === 0 ? 'passed' : 'failed'] += 1
  if (status !== 0) failures.push(name)
  return status
}

function addTests(path, read) {
  if (!existsSync(path)) return
  const { passed, failed } = read(JSON.parse(readFileSync(path, 'utf8')))
  counts.passed += passed
  counts.failed += failed
}

function finish() {
  if (failures.length > 0) say(`\nFailed: ${failures.join(', ')}`)
  say(`\n${counts.passed} passed, ${counts.failed} failed`)
  process.exit(counts.failed === 0 ? 0 : 1)
}

if (step('install', install) !== 0) finish()
step('browser', installChromium)
step('R, for the comparison with it', installR)
step('lint', () => runBin('eslint', ['.', '--max-warnings', '0']))
step('format', () => runBin('prettier', ['--check', '--log-level', 'warn', '.']))
step('types', () => runBin('next', ['typegen']) || runBin('tsc', ['--noEmit']))
step('purity', () => runBin('tsc', ['--noEmit', '-p', 'lib/checks']))
step('unit and integration tests', () =>
  runBin('vitest', ['run', '--reporter=default', '--reporter=json', `--outputFile.json=${unitReport}`]),
)
addTests(unitReport, (r) => ({ passed: r.numPassedTests, failed: r.numFailedTests }))
const built = step('build', () => run(process.execPath, ['scripts/build.mjs'], { ASSIZE_TYPES_CHECKED: '1' }))
if (built === 0) {
  step('end-to-end tests', () => runBin('playwright', ['test'], { ASSIZE_E2E_REPORT: e2eReport }))
  addTests(e2eReport, (r) => ({ passed: r.stats.expected + r.stats.flaky, failed: r.stats.unexpected }))
}
finish()

function apt(...args) {
  const isRoot = process.getuid?.() === 0
  return isRoot ? run('apt-get', args, quiet) : run('sudo', ['apt-get', ...args], quiet)
}

function installPackages(...names) {
  return apt('update', '-qq') || apt('install', '-y', '-qq', '--no-install-recommends', ...names)
}

function installChromium() {
  return existsSync('/usr/bin/chromium') ? 0 : installPackages('chromium')
}

/** R is a witness, not a part of the product: where it cannot be had, the tests that ask it are skipped. */
function installR() {
  if (existsSync('/usr/bin/Rscript')) return 0
  if (installPackages('r-base-core', 'r-cran-mvtnorm') !== 0) {
    say('skipped: Rscript cannot be installed here, so nothing is held against a running R')
  }
  return 0
}
