import type { CaseAnswer, Expected, HookupAnswer, HookupCase } from './form'
import { forbidden } from './must-not'
import { Rig } from './rig'

export interface Judgement {
  readonly id: string
  readonly failures: readonly string[]
  /** Warnings that give none of the expected ones. */
  readonly noise: number
}

/** Compares an answer with a case, by the rules of the case form. */
export function judge(c: HookupCase, answer: HookupAnswer): Judgement {
  const { id, expected } = c
  if (answer.possible !== expected.possible) {
    const verdict = `verdict: ${answer.possible} instead of ${expected.possible}`
    return { id, failures: [verdict], noise: 0 }
  }
  const answers = answer.answers ?? []
  const warned = [...(answer.warnings ?? []), ...(answers[0]?.warnings ?? [])]
  const wanted = (expected.warnings ?? []).map((w) => w.code)
  const missing = wanted.filter((code) => !warned.some((w) => w.code === code))
  return {
    id,
    failures: [
      ...judgeAnswers(c, answers),
      ...missing.map((code) => `warning missing: ${code}`),
      ...((answers[0]?.warnings ?? []).length > 6 ? ['more than six warnings'] : []),
      ...forbidden(c, answer),
    ],
    noise: warned.filter((w) => !w.code || !wanted.includes(w.code)).length,
  }
}

function judgeAnswers(c: HookupCase, answers: readonly CaseAnswer[]): string[] {
  if (answers.length === 0) return c.expected.possible === 'no' ? [] : ['no answer is given']
  return answers.flatMap((one, i) =>
    judgeAnswer(c, one, i === 0).map((f) => (i === 0 ? f : `answer ${i + 1}: ${f}`)),
  )
}

function judgeAnswer(c: HookupCase, answer: CaseAnswer, first: boolean): string[] {
  const rig = new Rig(c, answer)
  return [
    ...rig.wiring(),
    ...(first ? quality(c.expected, answer) : []),
    ...(first ? mustSettings(c, answer, rig) : []),
  ]
}

const rank = (form: string): number => {
  const order = ['none', 'luma-only', 'rf', 'composite', 's-video']
  const at = order.indexOf(form)
  if (at >= 0) return at
  return form === 'digital' ? 6 : 5
}

const SOUND_ORDER = ['none', 'mono-one-channel-lost', 'mono', 'stereo']

function quality(expected: Expected, answer: CaseAnswer): string[] {
  const found: string[] = []
  if (answer.quality.picture !== expected.quality.picture) {
    found.push(`picture: ${answer.quality.picture} instead of ${expected.quality.picture}`)
  }
  if (rank(answer.quality.form) < rank(expected.quality.form)) {
    found.push(`form: ${answer.quality.form} instead of ${expected.quality.form}`)
  }
  if (SOUND_ORDER.indexOf(answer.quality.sound) < SOUND_ORDER.indexOf(expected.quality.sound)) {
    found.push(`sound: ${answer.quality.sound} instead of ${expected.quality.sound}`)
  }
  return found
}

/** Every must setting of a unit in the chain, where the same sockets of that unit are used as in the best answer. */
function mustSettings(c: HookupCase, answer: CaseAnswer, rig: Rig): string[] {
  return (c.expected.settings ?? [])
    .filter((s) => s.need === 'must')
    .flatMap((s): string[] => {
      // A setting that follows another unit's holds only where that unit is in the chain.
      if (!rig.sameSockets(s.on) || !rig.has(s.to)) return []
      const control = rig.unit(s.on)?.settings?.find((k) => k.name === s.set)
      const given = answer.settings.find(
        (a) => a.on === s.on && (a.set === s.set || (control && a.set === control.class)),
      )
      if (!given) return [`setting missing: ${s.on} ${s.set}`]
      const allowed = [s.to, ...(s.oneOf ?? [])]
      const any = allowed.some((a) => /any channel/.test(a))
      const same = any || allowed.some((a) => rig.samePosition(a, given.to))
      return same ? [] : [`setting: ${s.on} ${s.set} to ${given.to} instead of ${s.to}`]
    })
}
