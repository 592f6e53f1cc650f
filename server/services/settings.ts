interface Settings {
  session: { password: string }
  publicUrl: string
  logHost: string
  mail: { url: string, from: string }
}

/** Stops the start with the name of the variable that is missing or weak. */
export function checkSettings(config: Settings): void {
  const wrong: string[] = []
  const need = (name: string, good: boolean, why: string) => {
    if (!good) wrong.push(`${name}: ${why}`)
  }
  need('NUXT_SESSION_PASSWORD', config.session.password.length >= 32 && new Set(config.session.password).size >= 8, 'a secret of at least 32 characters, not a repetition (for example `openssl rand -base64 33`)')
  need('NUXT_PUBLIC_URL', /^https?:\/\/[^/]+$/.test(config.publicUrl), 'the address people type, without a path, for example https://book.example')
  need('NUXT_LOG_HOST', /^[a-z0-9.-]+$/.test(config.logHost), 'the name under which this deployment signs its logs, for example book.example')
  need('NUXT_MAIL_FROM', config.mail.from.includes('@'), 'the sender of account mail, for example "Tankside <book@book.example>"')
  if (wrong.length > 0) throw new Error(`the settings are not complete:\n  ${wrong.join('\n  ')}`)
}

/** A demonstration has a mail server of its own; every other deployment names one. Asked once it is known which of the two this is. */
export function checkMailUrl(url: string, demo: boolean): void {
  if (demo && url === '') return
  if (!/^smtps?:\/\//.test(url)) throw new Error('the settings are not complete:\n  NUXT_MAIL_URL: where mail goes, for example smtp://mail.example:587')
}
