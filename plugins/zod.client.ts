import { config } from 'zod'

// zod compiles parsers with `new Function`, which the content policy forbids; said at module level, before any schema is used
config({ jitless: true })

export default defineNuxtPlugin(() => {})
