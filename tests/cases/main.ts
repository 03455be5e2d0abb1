import { readFileSync } from 'node:fs'
import { findHookups } from '@coaxwain/matcher'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import { toCaseAnswer } from './answer'
import type { CaseFile, HookupAnswer } from './form'
import { judge } from './judge'
import { translate } from './translate'

/** `npm run cases -- [--json] [--only hookups|channels|levels] FILE...` */
const args = process.argv.slice(2)
const json = args.includes('--json')
const onlyAt = args.indexOf('--only')
const only = onlyAt < 0 ? null : args[onlyAt + 1]
const files = args.filter((a, i) => !a.startsWith('--') && (onlyAt < 0 || i !== onlyAt + 1))

const wants = (kind: string): boolean => only === null || only === kind

if (files.length === 0) {
  process.stderr.write('Name at least one case file.\n')
  process.exit(2)
}

const read = (file: string): CaseFile => JSON.parse(readFileSync(file, 'utf8')) as CaseFile

function answerOf(file: CaseFile): HookupAnswer[] {
  return (file.hookupCases ?? []).map((c) => {
    const { id, source, display, shelf, environment, aim } = c
    const question = {
      id,
      source,
      display,
      shelf,
      environment,
      ...(aim === undefined ? {} : { aim }),
    }
    const translated = translate(question)
    const answer = findHookups(translated.snapshot, translated.question, { parts: ORDINARY_PARTS })
    return toCaseAnswer(question, translated, answer, ORDINARY_PARTS)
  })
}

const write = (line: string): void => void process.stdout.write(`${line}\n`)

if (json) {
  const hookupAnswers = wants('hookups') ? files.flatMap((f) => answerOf(read(f))) : []
  write(
    JSON.stringify({ form: 'hookup-answers/1', ...(wants('hookups') ? { hookupAnswers } : {}) }),
  )
} else {
  let passed = 0
  let failed = 0
  let noise = 0
  for (const path of files) {
    const file = read(path)
    if (wants('hookups')) {
      const answers = answerOf(file)
      ;(file.hookupCases ?? []).forEach((c, i) => {
        const result = judge(c, answers[i]!)
        noise += result.noise
        if (result.failures.length === 0) passed++
        else failed++
        write(
          `${result.failures.length === 0 ? 'pass' : 'FAIL'} ${c.id}${result.failures.length ? ': ' + result.failures.join('; ') : ''}`,
        )
      })
    }
    for (const kind of ['channels', 'levels'] as const) {
      const list = kind === 'channels' ? file.channelCases : file.levelCases
      if (!wants(kind)) continue
      for (const c of list ?? []) {
        failed++
        write(`FAIL ${c.id}: not answered`)
      }
    }
  }
  write(`noise: ${noise} warnings that nobody expected`)
  write(`${passed} passed, ${failed} failed`)
  process.exitCode = failed > 0 ? 1 : 0
}
