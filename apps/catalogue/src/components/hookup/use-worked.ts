import type { Hookup } from '@coaxwain/shelf'
import { ref, watch } from 'vue'
import { useCollection } from '../../composables/use-collection'
import { useFailure } from '../../composables/use-failure'
import { useToday } from '../../composables/use-today'
import { useWords } from '../../composables/use-words'
import { usedParts } from '../../format/used-parts'
import { useAnnouncer } from '../../stores/announcer'
import { useSaving } from '../../stores/saving'
import { useSnapshot } from '../../stores/snapshot'
import { useUnits } from '../../stores/units'

export type Outcome = 'unknown' | 'worked' | 'failed'

/** What came of a hookup, and noting it on the units that it used. */
export function useWorked(hookup: () => Hookup) {
  const { say } = useWords()
  const { tell } = useFailure()
  const collection = useCollection()
  const today = useToday()
  const units = useUnits()
  const store = useSnapshot()
  const saving = useSaving()
  const announcer = useAnnouncer()
  const outcome = ref<Outcome>('unknown')
  const busy = ref(false)

  /** Another hookup has not been tried yet. */
  watch(hookup, () => (outcome.value = 'unknown'))

  async function worked(): Promise<void> {
    busy.value = true
    const noted = await saving.track(
      units.noteWorked(collection.value, usedParts(hookup(), store.lookup), {
        on: today.value,
        how: say('answer.worked-how'),
      }),
    )
    busy.value = false
    if (!noted.ok) return tell(noted.problem)
    outcome.value = 'worked'
    announcer.tell(say('answer.worked-noted'))
    await store.load(collection.value)
  }

  function failed(): void {
    outcome.value = 'failed'
  }

  return { outcome, busy, worked, failed }
}
