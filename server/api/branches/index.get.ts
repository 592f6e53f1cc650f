import { readFirm } from '#server/services/books'

export default defineRoute('GET /api/branches', ({ file }) => readFirm(file))
