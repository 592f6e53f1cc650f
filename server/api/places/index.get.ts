import { readPlaces } from '#server/services/books'

export default defineRoute('GET /api/places', ({ file, actor, query }) => readPlaces(file, actor, query))
