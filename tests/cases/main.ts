import { readFileSync } from 'node:fs'
import { findHookups } from '@coaxwain/matcher'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import { toCaseAnswer } from './answer'
import type { CaseFile, HookupAnswer, HookupCase } from './form'
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

function answerTo(c: HookupCase): HookupAnswer {
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
  return toCaseAnswer(question, answer, ORDINARY_PARTS)
}

/** A case that cannot be read is named and left out, so that the others are answered all the same. */
function answerOf(file: CaseFile): (HookupAnswer | null)[] {
  return (file.hookupCases ?? []).map((c) => {
    try {
      return answerTo(c)
    } catch (error) {
      process.stderr.write(`${c.id} is not answered: ${String(error)}\n`)
      process.exitCode = 1
      return null
    }
  })
}

const write = (line: string): void => void process.stdout.write(`${line}\n`)

interface Score {
  readonly passed: number
  readonly failed: number
  readonly noise: number
}

const sum = (scores: readonly Score[], of: keyof Score): number =>
  scores.reduce((total, s) => total + s[of], 0)

function scoreHookups(file: CaseFile): Score[] {
  if (!wants('hookups')) return []
  const answers = answerOf(file)
  return (file.hookupCases ?? []).map((c, i) => {
    const answer = answers[i]
    const { failures, noise } = answer ? judge(c, answer) : { failures: ['not answered'], noise: 0 }
    const passed = failures.length === 0
    write(passed ? `pass ${c.id}` : `FAIL ${c.id}: ${failures.join('; ')}`)
    return { passed: passed ? 1 : 0, failed: passed ? 0 : 1, noise }
  })
}

function scoreUnanswered(file: CaseFile): Score[] {
  const cases = [
    ...(wants('channels') ? (file.channelCases ?? []) : []),
    ...(wants('levels') ? (file.levelCases ?? []) : []),
  ]
  return cases.map((c) => {
    write(`FAIL ${c.id}: not answered`)
    return { passed: 0, failed: 1, noise: 0 }
  })
}

if (json) {
  const hookupAnswers = wants('hookups')
    ? files.flatMap((f) => answerOf(read(f)).flatMap((a) => a ?? []))
    : []
  write(
    JSON.stringify({ form: 'hookup-answers/1', ...(wants('hookups') ? { hookupAnswers } : {}) }),
  )
} else {
  const scores = files.map(read).flatMap((f) => [...scoreHookups(f), ...scoreUnanswered(f)])
  write(`noise: ${sum(scores, 'noise')} warnings that nobody expected`)
  write(`${sum(scores, 'passed')} passed, ${sum(scores, 'failed')} failed`)
  if (sum(scores, 'failed') > 0) process.exitCode = 1
}
