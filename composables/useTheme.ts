/** The sheet that the reader writes on: by day, by night, in the sun, or as the device asks. */
export const SHEET_CHOICES = ['auto', 'light', 'dark', 'sun'] as const
export type SheetChoice = typeof SHEET_CHOICES[number]

const YEAR = 365 * 24 * 60 * 60

/** Kept in a cookie, so that the server writes `<html data-sheet>` itself: no flash, and no inline script for the content policy to allow. */
export function useTheme() {
  const cookie = useCookie<string>('sheet', { default: () => 'auto', maxAge: YEAR, sameSite: 'lax', path: '/' })
  return computed<SheetChoice>({
    get: () => SHEET_CHOICES.find(choice => choice === cookie.value) ?? 'auto',
    set: (choice) => { cookie.value = choice },
  })
}
