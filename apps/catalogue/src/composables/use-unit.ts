import type { UnitDetail } from '@coaxwain/contract'
import type { Result } from '@coaxwain/result'
import { fitted, type Modification, type Signal, type TestState } from '@coaxwain/shelf'
import { computed, ref, shallowRef } from 'vue'
import { codeOf, type Failure } from '../api/failure'
import type { EvidenceRow, NotedState } from '../format/evidence-rows'
import { useAnnouncer } from '../stores/announcer'
import { useSaving } from '../stores/saving'
import { useSnapshot } from '../stores/snapshot'
import { useUnits } from '../stores/units'
import { useFailure } from './use-failure'
import { useWords } from './use-words'

/** One unit with its model, and every way to change what is noted of it. */
export function useUnit(collection: () => string, uid: () => string) {
  const { say } = useWords()
  const { tell } = useFailure()
  const store = useUnits()
  const snapshot = useSnapshot()
  const saving = useSaving()
  const announcer = useAnnouncer()

  const unit = shallowRef<UnitDetail | null>(null)
  const failure = shallowRef<Failure | null>(null)
  const busy = ref(false)

  const device = computed(() => {
    const model = unit.value && snapshot.lookup.model(unit.value.model.uid)
    return unit.value && model?.type === 'device' ? fitted(model, unit.value.modifications) : null
  })
  const piece = computed(() =>
    unit.value ? (snapshot.lookup.piece(unit.value.model.uid) ?? null) : null,
  )

  async function load(): Promise<void> {
    failure.value = null
    const [shelf, reply] = await Promise.all([
      snapshot.ensure(collection()),
      store.read(collection(), uid()),
    ])
    if (!reply.ok) failure.value = reply.problem
    else if (!shelf.ok) failure.value = shelf.problem
    else unit.value = reply.value
  }

  /** One write at a time; afterwards the unit is what the server says. */
  async function write(
    act: () => Promise<Result<UnitDetail, Failure>>,
    done: string,
  ): Promise<boolean> {
    if (busy.value) return false
    busy.value = true
    const reply = await saving.track(act())
    busy.value = false
    if (!reply.ok) {
      if (codeOf(reply.problem) === 'version-stale') await load()
      failure.value = reply.problem
      tell(reply.problem)
      return false
    }
    failure.value = null
    unit.value = reply.value
    announcer.tell(done)
    return true
  }

  const evidence = ({ state, on, how }: NotedState) => ({
    state,
    ...(on === '' ? {} : { on }),
    ...(how === '' ? {} : { how }),
  })

  function noteState(row: EvidenceRow, noted: NotedState): Promise<boolean> {
    const done = say('unit.state-saved', { what: row.title, state: say(`state.${noted.state}`) })
    return write(() => {
      if (!unit.value) throw new Error('no unit to change')
      const ports = noted.port === null ? row.ports : [noted.port]
      return store.changeStates(collection(), unit.value, {
        ...(row.jack === null
          ? {}
          : { forms: ports.map((port) => ({ jack: row.jack ?? '', port, ...evidence(noted) })) }),
        ...(row.function === null
          ? {}
          : { functions: [{ function: row.function, ...evidence(noted) }] }),
      })
    }, done)
  }

  /** What came of a test chain, on everything that it tried. */
  const noteSignals = (
    signals: readonly Signal[],
    { state, on, what }: { readonly state: TestState; readonly on: string; readonly what: string },
  ): Promise<boolean> => {
    const noted = evidence({ state, on, how: say('prove.how'), port: null })
    return write(
      () =>
        store.changeStates(collection(), held(), {
          forms: signals.flatMap((s) => ('jack' in s ? [{ ...s, ...noted }] : [])),
          functions: signals.flatMap((s) => ('function' in s ? [{ ...s, ...noted }] : [])),
        }),
      say('unit.state-saved', { what, state: say(`state.${state}`) }),
    )
  }

  const noteStands = (stands: Record<string, string>): Promise<boolean> =>
    write(() => store.changeStands(collection(), held(), { stands }), say('unit.saved'))

  const noteChanges = (modifications: Modification[]): Promise<boolean> =>
    write(
      () => store.changeModifications(collection(), held(), { modifications }),
      say('unit.saved'),
    )

  const restore = (): Promise<boolean> =>
    write(() => store.restore(collection(), held()), say('unit.restored'))

  function held(): UnitDetail {
    if (!unit.value) throw new Error('no unit to change')
    return unit.value
  }

  return {
    unit,
    device,
    piece,
    failure,
    busy,
    load,
    noteState,
    noteSignals,
    noteStands,
    noteChanges,
    restore,
  }
}
