import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import type { SessionAnswer, SignIn } from '../../../shared/api/session.ts'
import type { Action } from '../../../shared/policy.ts'
import { ApiProblem, onSessionEnded, request } from '../../api/request.ts'

const key = 'mudring.member'

/** Who is signed in and what they may do. When the session ends, what is on the screen stays there until they sign in again. */
export const useSessionStore = defineStore('session', () => {
  const session = shallowRef<SessionAnswer>()
  const hasEnded = ref(false)
  const resumed = new Set<() => void>()
  onSessionEnded(() => {
    if (session.value) hasEnded.value = true
  })
  const member = computed(() => session.value?.member)
  const company = computed(() => session.value?.company)

  return { session, member, company, hasEnded, know, signIn, signOut, can, onResumed, refresh }

  function can(action: Action): boolean {
    return session.value?.can.includes(action) ?? false
  }

  /** Whether somebody is signed in; asks the server once. Without a connection, whoever was here last still is. */
  async function know(): Promise<boolean> {
    if (session.value) return true
    try {
      await refresh()
      return true
    } catch (error) {
      if (error instanceof ApiProblem) return false
      const kept = localStorage.getItem(key)
      if (kept) session.value = JSON.parse(kept) as SessionAnswer
      return session.value !== undefined
    }
  }
  async function refresh() {
    keep(await request<SessionAnswer>('GET', '/api/session'))
  }

  async function signIn(given: SignIn) {
    const before = session.value?.member.id
    const answer = await request<SessionAnswer>('POST', '/api/session', given)
    // Somebody else at the same screen must not see or send what is not theirs.
    if (before !== undefined && before !== answer.member.id) {
      keep(answer)
      location.assign('/jobs')
      return
    }
    keep(answer)
    hasEnded.value = false
    for (const listener of resumed) listener()
  }
  async function signOut() {
    await request('DELETE', '/api/session')
    localStorage.removeItem(key)
    session.value = undefined
    location.assign('/sign-in')
  }
  function keep(answer: SessionAnswer) {
    session.value = answer
    localStorage.setItem(key, JSON.stringify(answer))
  }
  /** Told when somebody has signed in again over what they were doing. */
  function onResumed(listener: () => void): () => void {
    resumed.add(listener)
    return () => resumed.delete(listener)
  }
})
