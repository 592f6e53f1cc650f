import { readFileSync } from 'node:fs'

/** A route of the build, as the contract table names it: `GET /api/session`. Without a method it answers to all. */
export interface BuiltRoute { method: string | null, path: string }

/** The routes that the build really has, read from its own table of handlers. */
export function builtRoutes(): BuiltRoute[] {
  const source = readFileSync('.output/server/chunks/nitro/nitro.mjs', 'utf8')
  const handlers = source.matchAll(/\{ route: ['"]([^'"]+)['"], handler: [\w$]+, lazy: (?:true|false), middleware: false, method: (?:undefined|"(\w+)") \}/g)
  return [...handlers].map(([, path = '', method]) => ({ path, method: method?.toUpperCase() ?? null }))
}
