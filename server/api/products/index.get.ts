import { readProducts } from '#server/services/books'

export default defineRoute('GET /api/products', ({ file, query }) => readProducts(file, query))
