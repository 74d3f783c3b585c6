/**
 * Makes damaged files from a fixed seed and takes each in as an upload and its audit do. Prints how many were read and
 * how many refused, by message; ends with status 1 on a crash, a hang, a fault of ours or a message that leaks.
 * `npx tsx scripts/damage/run.ts [files] [seed]`
 */
import { fork, type ChildProcess } from 'node:child_process'
import { fileURLToPath } from 'node:url'

type Answer = { number: number; format: string; damage: string; kind: string; says: string }

const files = Number(process.argv[2] ?? 2000)
const seed = Number(process.argv[3] ?? 1)
const limit = 30_000
const processes = 2

const refused = new Map<string, number>()
const counts = new Map<string, number>()
const failures: string[] = []
let next = 0

const count = (map: Map<string, number>, key: string) => map.set(key, (map.get(key) ?? 0) + 1)

await Promise.all(Array.from({ length: processes }, work))
for (const [key, number] of [...counts].sort()) console.log(`${String(number).padStart(6)} ${key}`)
console.log('\nrefused, by message:')
for (const [message, number] of [...refused].sort((a, b) => b[1] - a[1]))
  console.log(`${String(number).padStart(6)} ${message}`)
for (const failure of failures) console.error(`\n${failure}`)
console.log(`\n${files} files, ${failures.length} failures`)
process.exitCode = failures.length > 0 ? 1 : 0

async function work(): Promise<void> {
  let child = await start()
  while (next < files) {
    const number = next++
    const answer = await ask(child, number)
    if (typeof answer === 'string') {
      failures.push(`file ${number}: ${answer}`)
      child.kill('SIGKILL')
      child = await start()
      continue
    }
    count(counts, `${answer.format} ${answer.damage}: ${answer.kind}`)
    if (answer.kind === 'refused') count(refused, answer.says)
    if (answer.kind === 'fault')
      failures.push(`file ${number} (${answer.format}, ${answer.damage}): ${answer.says}`)
  }
  child.kill()
}

function start(): Promise<ChildProcess> {
  const child = fork(fileURLToPath(new URL('./worker.ts', import.meta.url)), {
    execArgv: ['--import', 'tsx', '--max-old-space-size=1024'],
  })
  return new Promise((resolve, reject) => {
    child.once('message', () => resolve(child))
    child.once('exit', (code) => reject(new Error(`a process of the run did not start (${code})`)))
  })
}

/** The answer, or what went wrong in its place. */
function ask(child: ChildProcess, number: number): Promise<Answer | string> {
  return new Promise((resolve) => {
    const settle = (answer: Answer | string) => {
      clearTimeout(timer)
      child.off('message', settle).off('exit', crashed)
      resolve(answer)
    }
    const crashed = (code: number | null) => settle(`crash, status ${code}`)
    const timer = setTimeout(() => settle(`no answer within ${limit / 1000} seconds`), limit)
    child.once('message', settle).once('exit', crashed)
    child.send({ seed, number })
  })
}
