import { compile, createCoreContext, registerMessageCompiler, resolveValue, translate } from '@intlify/core-base'
import account from '../../i18n/locales/en/account.json'
import books from '../../i18n/locales/en/books.json'
import catalogues from '../../i18n/locales/en/catalogues.json'
import checks from '../../i18n/locales/en/checks.json'
import common from '../../i18n/locales/en/common.json'
import daybook from '../../i18n/locales/en/daybook.json'
import entry from '../../i18n/locales/en/entry.json'
import errors from '../../i18n/locales/en/errors.json'
import mail from '../../i18n/locales/en/mail.json'
import notices from '../../i18n/locales/en/notices.json'
import paper from '../../i18n/locales/en/paper.json'
import today from '../../i18n/locales/en/today.json'
import visit from '../../i18n/locales/en/visit.json'

registerMessageCompiler(compile)

const messages = { en: Object.assign({}, account, books, catalogues, checks, common, daybook, entry, errors, mail, notices, paper, today, visit) as Record<string, unknown> }
const context = createCoreContext({ locale: 'en', fallbackLocale: 'en', messages: messages as never, messageResolver: resolveValue, missingWarn: false, fallbackWarn: false })

/** The catalogue's sentence for a key, on paper, in mail and in answers; the key itself where the catalogue has none. */
export type Words = (key: string, params?: Record<string, string | number>) => string

// the library's own types spell out every key of the catalogue, which the compiler gives up on
const say = translate as unknown as (context: object, key: string, params: object) => unknown

export const words: Words = (key, params = {}) => String(say(context, key, params))
