export interface BookPage { to: string, word: string }

/** The pages of the book that this person's abilities open, in the order of the index. */
export function useBook() {
  const session = useSessionStore()
  const { t } = useI18n()
  const { can } = session
  // a customer reads what was done at the own place: the same page under the word that they know
  const isCustomer = computed(() => session.me?.roles.every(role => role === 'customer') ?? false)

  const pages = computed<BookPage[]>(() => {
    const ours = !isCustomer.value
    const all: (BookPage & { open: boolean })[] = [
      { to: '/', word: t('common.nav.today'), open: true },
      { to: '/daybook', word: ours ? t('common.nav.daybook') : t('common.nav.treatments'), open: can('entry.read') },
      { to: '/places', word: t('common.nav.places'), open: ours && can('book.read') },
      { to: '/shelf', word: t('common.nav.shelf'), open: ours && can('book.read') },
      { to: '/people', word: t('common.nav.people'), open: ours && can('people.read') },
      { to: '/equipment', word: t('common.nav.equipment'), open: ours && can('book.read') },
      { to: '/firm', word: t('common.nav.firm'), open: ours && can('firm.read') },
      { to: '/notices', word: t('common.nav.notices'), open: can('notice.read') },
      { to: '/account', word: t('common.nav.account'), open: true },
    ]
    return all.filter(page => page.open).map(({ to, word }) => ({ to, word }))
  })
  return { pages, maySign: computed(() => can('visit.sign')) }
}
