import { readEquipment } from '#server/services/books'

export default defineRoute('GET /api/equipment', ({ file, actor, query }) => readEquipment(file, actor, query))
