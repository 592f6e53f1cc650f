import { readProducts } from '#server/services/books'

export default defineRoute('GET /api/products', ({ file, query, now }) => readProducts(file, query, now))
