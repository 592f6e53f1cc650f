import { z } from 'zod'
import type { Contract } from '#shared/api/contract/define'
import { ErrorAnswerSchema, FileAnswer } from '#shared/api/contract/define'
import { CONTRACT } from '#shared/api/contract/index'
import { ERROR_STATUS } from '#shared/errors'

type Json = Record<string, unknown>

/** JSON Schema 2020-12 is what OpenAPI 3.1 speaks; `$schema` is said once for the document. */
function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any', reused: 'inline' }) as Json
  return rest
}

function parametersOf(schema: z.ZodObject | undefined, where: 'path' | 'query'): Json[] {
  return Object.entries(schema?.shape ?? {}).map(([name, part]) => ({
    name, in: where, required: where === 'path' || !(part as z.ZodType).safeParse(undefined).success, schema: schemaOf(part as z.ZodType, 'input'),
  }))
}

const DENIED = [...new Set(Object.values(ERROR_STATUS))]

function operation(contract: Contract): Json {
  const answers = Object.entries(contract.answers).map(([status, schema]) => [status, status === '204'
    ? { description: 'done, nothing to say' }
    : { description: 'as asked', content: { [schema === FileAnswer ? 'application/octet-stream' : 'application/json']: { schema: schemaOf(schema, 'output') } } }])
  const refusals = DENIED.map(status => [String(status), { $ref: '#/components/responses/Refusal' }])
  return {
    'summary': contract.summary,
    'x-ability': contract.ability,
    'parameters': [...parametersOf(contract.params, 'path'), ...parametersOf(contract.query, 'query')],
    ...(contract.body ? { requestBody: { required: true, content: { 'application/json': { schema: schemaOf(contract.body, 'input') } } } } : {}),
    'responses': Object.fromEntries([...answers, ...refusals]),
  }
}

/** The contract table as OpenAPI 3.1: it can't say anything that the routes do not do, since they are made from the same table. */
export function openApiDocument(): Json {
  const paths: Record<string, Json> = {}
  for (const [key, contract] of Object.entries(CONTRACT)) {
    const [method = '', path = ''] = key.split(' ')
    const at = path.replace(/:(\w+)/g, '{$1}')
    paths[at] = { ...paths[at], [method.toLowerCase()]: operation(contract) }
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Tankside', version: '1', description: 'A record of pesticide applications. The label is the law; this program is a record and does not replace the label, the state’s lead agency or medical help.' },
    jsonSchemaDialect: 'https://json-schema.org/draft/2020-12/schema',
    paths,
    components: { responses: { Refusal: { description: 'refused; `code` says why', content: { 'application/json': { schema: schemaOf(ErrorAnswerSchema, 'output') } } } } },
  }
}
