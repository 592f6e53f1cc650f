import { readProduct } from '#server/services/books'

export default defineRoute('GET /api/products/:id', ({ file, params }) => readProduct(file, params.id))
