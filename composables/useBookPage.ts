/** Search and place in the list of a book's page, kept in the address. */
export function useBookPage() {
  const route = useRoute()
  const query = computed(() => {
    const { q, cursor } = route.query
    return { ...(typeof q === 'string' && q ? { q } : {}), ...(typeof cursor === 'string' && cursor ? { cursor } : {}) }
  })
  const search = (q: string) => navigateTo({ query: q ? { q } : {} })
  return { query, search }
}
