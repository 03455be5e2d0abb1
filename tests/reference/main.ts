import { readFileSync } from 'node:fs'
import { readChecks, runChecks } from './run'

/** `npm run reference -- FILE...` */
const files = process.argv.slice(2)

const write = (line: string): void => void process.stdout.write(`${line}\n`)

function stop(why: string): never {
  process.stderr.write(`${why}\n`)
  process.exit(2)
}

if (files.length === 0) stop('Name at least one file of checks.')

const checks = files.flatMap((file) => {
  try {
    return readChecks(readFileSync(file, 'utf8'))
  } catch (error) {
    return stop(`${file}: ${error instanceof Error ? error.message : String(error)}`)
  }
})

const { kinds, failures, passed, failed } = runChecks(checks)
for (const kind of kinds) {
  write(`${kind.kind}: ${kind.passed} of ${kind.passed + kind.failed}`)
}
for (const { id, why } of failures) write(`FAIL ${id}: ${why.join('; ')}`)
write(`${passed} passed, ${failed} failed`)
process.exitCode = failed > 0 || checks.length === 0 ? 1 : 0
