/** The catalogue's sentence for a key: vue-i18n's `t` on a device, the server's own catalogue on paper and in mail. A param `n` chooses the plural form. */
export type Words = (key: string, params?: Record<string, string | number>) => string
