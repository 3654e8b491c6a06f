import type { Request, Response } from 'express'
import { z } from 'zod'
import type { Action, Role } from '../../shared/policy.ts'
import type { Db } from '../db/client.ts'
import type { AppDeps } from './deps.ts'

/** Who asks: read afresh for every request, so that a lost right is lost at once. */
export interface SignedIn {
  readonly companyId: string
  readonly id: string
  readonly name: string
  readonly email: string
  readonly role: Role
}

export interface RouteInput<Params, Query, Body> {
  readonly params: Params
  readonly query: Query
  readonly body: Body
}

export interface PublicContext {
  readonly db: Db
  readonly deps: AppDeps
  readonly request: Request
  readonly response: Response
}
export interface MemberContext extends PublicContext {
  readonly member: SignedIn
}

/** What a handler returns when it has answered by itself: a stream, a file. */
export const answered = Symbol('answered')
export const noInput = z.strictObject({})

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

interface Shape<Params extends z.ZodType, Query extends z.ZodType, Body extends z.ZodType> {
  readonly method: Method
  readonly path: `/api/${string}`
  readonly params: Params
  readonly query: Query
  readonly body: Body
  /**
   * What may leave the server: fields it does not name are left out, an answer that does not fit is a fault of ours.
   */
  readonly response?: z.ZodType
}

/** One route as the server holds it, its types forgotten. */
export interface Route {
  readonly method: Method
  readonly path: string
  readonly action: Action | 'public'
  readonly params: z.ZodType
  readonly query: z.ZodType
  readonly body: z.ZodType
  readonly response?: z.ZodType
  readonly handle: (
    context: PublicContext & { readonly member?: SignedIn },
    input: RouteInput<unknown, unknown, unknown>,
  ) => Promise<unknown>
}

/**
 * A route for members who may do `action`. The only way to add one: a route without an action or schemas does not
 * compile, and does not start.
 */
export function defineRoute<Params extends z.ZodType, Query extends z.ZodType, Body extends z.ZodType>(
  shape: Shape<Params, Query, Body> & {
    readonly action: Action
    readonly handle: (
      context: MemberContext,
      input: RouteInput<z.output<Params>, z.output<Query>, z.output<Body>>,
    ) => Promise<unknown>
  },
): Route {
  return shape as unknown as Route
}

/** A route for anybody: signing in, and asking who one is. */
export function definePublicRoute<Params extends z.ZodType, Query extends z.ZodType, Body extends z.ZodType>(
  shape: Shape<Params, Query, Body> & {
    readonly handle: (
      context: PublicContext,
      input: RouteInput<z.output<Params>, z.output<Query>, z.output<Body>>,
    ) => Promise<unknown>
  },
): Route {
  return { ...shape, action: 'public' } as unknown as Route
}
