import type { Ability } from '#shared/access/abilities'
import type { Me, SessionAnswer } from '#shared/api/contract/session'

/** Who is signed in, for which firm; nothing is remembered between visits. */
export const useSessionStore = defineStore('session', () => {
  const me = ref<Me | null>(null)
  /** One-click sign-in stands open: a demonstration, asked from near. */
  const demo = ref(false)
  /** The server has answered. False: there was no signal yet, so `me` says nothing. */
  const known = ref(false)

  function take(answer: SessionAnswer) {
    me.value = answer.me
    demo.value = answer.demo
    known.value = true
  }
  const can = (ability: Ability): boolean => me.value?.abilities.includes(ability) ?? false
  return { me, demo, known, take, can }
})
