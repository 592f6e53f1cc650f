import type { Role } from '#shared/books/shapes'

/** `compliance officer (Albany), applicator (all branches)` */
export function useRoleWords() {
  const { t } = useI18n()
  const words: Record<Role, string> = { owner: t('common.roles.owner'), officer: t('common.roles.officer'), applicator: t('common.roles.applicator'), customer: t('common.roles.customer') }
  return (roles: readonly { role: Role, branch: string | null }[]): string => roles.map(({ role, branch }) => `${words[role]} (${branch ?? t('books.people.everywhere')})`).join(', ')
}
