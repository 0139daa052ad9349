import { defineStore } from 'pinia'
import { computed, ref } from 'vue'
import { can, isEverGranted } from '@shared/access'
import type { Actor, Facts, Right, RoleOfPerson } from '@shared/access'
import type { SessionView, UnitsName, VocabularyName } from '@shared/contracts'
import { Failure } from '@shared/failure'
import { makeFirstManager, readSession, setPreferences, signIn, signOut } from '@/api/session'

/** Who is signed in, in which units and words they read, and what they may: undefined = not asked yet, null = nobody. */
export const useSessionStore = defineStore('session', () => {
  const session = ref<SessionView | null>()

  const actor = computed<Actor | undefined>(() => {
    if (!session.value) return undefined
    const { person, memberships } = session.value
    return {
      personId: person.id,
      name: person.name,
      memberships: memberships.map(({ role, client, mill }) => ({
        role,
        clientId: client?.id ?? null,
        millId: mill?.id ?? null,
      })),
    }
  })
  const roles = computed<readonly RoleOfPerson[]>(() => [
    ...new Set(session.value?.memberships.map(({ role }) => role) ?? []),
  ])
  const units = computed<UnitsName>(
    () => session.value?.person.units ?? session.value?.workshop.units ?? 'mm',
  )
  const vocabulary = computed<VocabularyName>(
    () => session.value?.person.vocabulary ?? session.value?.workshop.vocabulary ?? 'moulding',
  )

  const mayDo = (right: Right, facts: Facts = {}) =>
    actor.value !== undefined && can(actor.value, right, facts)
  /** Whether some membership bears the right for some row: enough to show a way in, never to decide. */
  const mayEver = (right: Right) => actor.value !== undefined && isEverGranted(actor.value, right)
  const hasRole = (role: RoleOfPerson) => roles.value.includes(role)

  /** Asks once who is signed in; a server out of reach is told on. */
  async function load(): Promise<void> {
    if (session.value !== undefined) return
    try {
      session.value = await readSession()
    } catch (error) {
      if (!(error instanceof Failure) || error.code !== 'not-signed-in') throw error
      session.value = null
    }
  }
  async function enter(email: string, password: string): Promise<void> {
    session.value = await signIn({ email, password })
  }
  async function enterAsFirstManager(first: Parameters<typeof makeFirstManager>[0]): Promise<void> {
    session.value = await makeFirstManager(first)
  }
  async function leave(): Promise<void> {
    await signOut()
    session.value = null
  }
  const forget = () => {
    session.value = null
  }
  /** Reads again who is signed in and how the workshop is set. */
  async function refresh(): Promise<void> {
    session.value = await readSession()
  }
  async function prefer(choice: Parameters<typeof setPreferences>[0]): Promise<void> {
    session.value = await setPreferences(choice)
  }

  return {
    session,
    actor,
    roles,
    units,
    vocabulary,
    mayDo,
    mayEver,
    hasRole,
    load,
    enter,
    enterAsFirstManager,
    leave,
    forget,
    refresh,
    prefer,
  }
})
