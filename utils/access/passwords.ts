export const PASSWORD_MIN = 12
/** Longer ones would only cost time; scrypt takes any length. */
export const PASSWORD_MAX = 200

/**
 * Beginnings that guessers try first, longer than the minimum or repeated up to it. From memory: no list is copied;
 * the minimum length does the work, these are the long ones that people still come up with.
 */
const COMMON = ['password', 'passwort', 'qwerty', 'qwertz', 'asdfgh', 'zxcvbn', 'letmein', 'welcome', 'iloveyou', 'admin', 'administrator', 'changeme', 'tankside', 'treatment', 'pestcontrol', 'lawncare', 'abc', '123', '1234', '12345', '123456', '1234567', '12345678', '123456789', '1234567890', '987654321', '111', '000']

/** Text that is one short piece over and over: `abcabcabcabc`. */
function isRepetition(text: string): boolean {
  return /^(.{1,4})\1+.{0,3}$/u.test(text)
}

/** Common pieces and digits, marks or years around them, and nothing else: `Password2026!`. */
function isCommon(text: string): boolean {
  let rest = text
  for (const piece of [...COMMON].sort((a, b) => b.length - a.length)) rest = rest.replaceAll(piece, '')
  return rest.replace(/[\d\W_]/gu, '').length <= 2
}

/** Which rule a new password breaks (a key of `errors.issues.*`), or null. Length counts characters, not bytes. */
export function weakness(password: string, email: string): 'password-short' | 'password-is-address' | 'password-common' | null {
  const plain = password.toLowerCase()
  const [name = ''] = email.toLowerCase().split('@')
  if ([...password].length < PASSWORD_MIN) return 'password-short'
  if (plain === email.toLowerCase() || (name.length >= 4 && plain.replaceAll(name, '').length <= 3)) return 'password-is-address'
  if (isRepetition(plain) || isCommon(plain)) return 'password-common'
  return null
}
