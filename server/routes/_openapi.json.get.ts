import { openApiDocument } from '#server/utils/openapi'

export default defineRoute('GET /_openapi.json', () => openApiDocument())
