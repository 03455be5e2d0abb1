import {
  hasRight,
  type Membership,
  type Mode,
  type Person,
  type Right,
  type Session,
} from '@coaxwain/contract'
import { err, ok, type Result } from '@coaxwain/result'
import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import { call } from '../api/client'
import type { Failure } from '../api/failure'

/** Who is looking, and at which collection. */
export const useSession = defineStore('session', () => {
  const mode = ref<Mode>('server')
  const person = shallowRef<Person | null>(null)
  const memberships = shallowRef<readonly Membership[]>([])
  const current = ref<string | null>(null)
  const known = ref(false)
  let loading: Promise<Result<void, Failure>> | null = null

  const membership = computed(
    () => memberships.value.find((m) => m.collection.uid === current.value) ?? null,
  )
  /** The collection that a page without one in its address means: the last one looked at, else the first. */
  const home = computed(() => membership.value ?? memberships.value[0] ?? null)
  const can = computed(
    () =>
      (right: Right): boolean =>
        membership.value !== null && hasRight(membership.value.role, right),
  )

  function take(session: Session): void {
    mode.value = session.mode
    person.value = session.person
    memberships.value = session.memberships
    known.value = true
  }

  /** Asks the server once; later calls share the first one's answer. */
  async function load(): Promise<Result<void, Failure>> {
    if (known.value) return ok(undefined)
    loading ??= call('readSession', {}).then((reply) => {
      loading = null
      if (!reply.ok) return err(reply.problem)
      take(reply.value)
      return ok(undefined)
    })
    return loading
  }

  async function signIn(email: string, password: string): Promise<Result<void, Failure>> {
    const reply = await call('signIn', { body: { email, password } })
    if (!reply.ok) return err(reply.problem)
    take(reply.value)
    return ok(undefined)
  }

  async function signOut(): Promise<Result<void, Failure>> {
    const reply = await call('signOut', {})
    if (!reply.ok) return err(reply.problem)
    forget()
    return ok(undefined)
  }

  /** The server no longer knows us: everything typed stays, only the person goes. */
  function forget(): void {
    person.value = null
    memberships.value = []
  }

  function enter(collection: string): boolean {
    if (!memberships.value.some((m) => m.collection.uid === collection)) return false
    current.value = collection
    return true
  }

  return {
    mode,
    person,
    memberships,
    membership,
    current,
    home,
    can,
    known,
    load,
    signIn,
    signOut,
    forget,
    enter,
  }
})
