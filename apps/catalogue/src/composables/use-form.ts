import type { FieldError } from '@coaxwain/contract'
import type { Result } from '@coaxwain/result'
import { hasSentence } from '@coaxwain/wording'
import { nextTick, ref, shallowRef } from 'vue'
import { fieldErrorsOf, type Failure } from '../api/failure'
import { useAnnouncer } from '../stores/announcer'
import { useSaving } from '../stores/saving'
import { useFailure } from './use-failure'
import { useWords } from './use-words'

export type FieldFaults = readonly Pick<FieldError, 'path' | 'code' | 'details'>[]

/** Sending a form: busy once, errors at their fields, focus on the first of them. */
export function useForm() {
  const { say } = useWords()
  const { tell } = useFailure()
  const saving = useSaving()
  const announcer = useAnnouncer()
  const busy = ref(false)
  const failure = shallowRef<Failure | null>(null)
  const faults = shallowRef<FieldFaults>([])

  /** The words for one field; faults deeper in it count as its own. */
  function errorOf(path: string): string {
    const fault = faults.value.find((f) => f.path === path || f.path.startsWith(`${path}.`))
    if (!fault) return ''
    const code = `field.${fault.code}`
    return hasSentence(code) ? say(code, fault.details) : say('field.bad-format')
  }

  async function show(found: FieldFaults): Promise<void> {
    faults.value = found
    if (found.length === 0) return
    announcer.warn(say('failure.fields', { count: found.length }))
    await nextTick()
    const first = document.querySelector<HTMLElement>(
      '.has-error input, .has-error select, .has-error textarea',
    )
    first?.focus()
  }

  /** Null when it could not be sent. */
  async function send<T>(write: () => Promise<Result<T, Failure>>): Promise<{ value: T } | null> {
    if (busy.value) return null
    busy.value = true
    failure.value = null
    faults.value = []
    const result = await saving.track(write())
    busy.value = false
    if (result.ok) return { value: result.value }
    failure.value = result.problem
    const fields = fieldErrorsOf(result.problem).map((e) => ({
      ...e,
      path: e.path.replace(/^document\./, ''),
    }))
    if (fields.length > 0) await show(fields)
    else tell(result.problem)
    return null
  }

  return { busy, failure, faults, errorOf, show, send }
}
