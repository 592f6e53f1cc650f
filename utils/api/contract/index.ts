import type { z } from 'zod'
import type { Contract } from '#shared/api/contract/define'
import { BOOKS } from '#shared/api/contract/books'
import { DAYBOOK } from '#shared/api/contract/daybook'
import { KIT } from '#shared/api/contract/kit'
import { NOTICES } from '#shared/api/contract/notices'
import { SESSION } from '#shared/api/contract/session'
import { VISITS } from '#shared/api/contract/visits'

/** All routes. A route that is missing here fails the access test; one that is here and not built does too. */
export const CONTRACT = { ...BOOKS, ...DAYBOOK, ...KIT, ...NOTICES, ...SESSION, ...VISITS } as const

export type RouteKey = keyof typeof CONTRACT
type Of<K extends RouteKey> = (typeof CONTRACT)[K]
type Parsed<C, P extends keyof Contract> = C extends Record<P, infer S> ? (S extends z.ZodType ? z.output<S> : undefined) : undefined

export type ParamsOf<K extends RouteKey> = Parsed<Of<K>, 'params'>
export type QueryOf<K extends RouteKey> = Parsed<Of<K>, 'query'>
export type BodyOf<K extends RouteKey> = Parsed<Of<K>, 'body'>

/** What the caller hands in, before defaults. */
type Given<C, P extends keyof Contract> = C extends Record<P, infer S> ? (S extends z.ZodType ? z.input<S> : undefined) : undefined
export type BodyInputOf<K extends RouteKey> = Given<Of<K>, 'body'>
export type ParamsInputOf<K extends RouteKey> = Given<Of<K>, 'params'>
export type QueryInputOf<K extends RouteKey> = Given<Of<K>, 'query'>

type Answers<C> = C extends { answers: infer A } ? { [S in keyof A]: A[S] extends z.ZodType ? z.output<A[S]> : never }[keyof A] : never
export type AnswerOf<K extends RouteKey> = Answers<Of<K>>
