import { makeKit } from '#server/services/kit'

export default defineRoute('GET /api/kit', ({ file, actor, now }) => makeKit(file, actor, now))
