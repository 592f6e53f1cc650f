export type Role = 'owner' | 'officer' | 'applicator' | 'customer'

export interface Me {
  person: string
  firm: { name: string, slug: string, id: string }
  roles: Role[]
  licence: string | null
  memberships: { id: string, firm: string }[]
  abilities: string[]
  demo: boolean
}

/** Who is signed in, for which firm; nothing is remembered between visits. */
export const useSessionStore = defineStore('session', () => {
  const me = ref<Me | null>(null)
  return { me }
})
