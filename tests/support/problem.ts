import type { Response } from 'supertest'
import { expect } from 'vitest'
import { problemSchema, type Problem } from '../../shared/api/problem.ts'

/** Asserts that an answer is problem details with this status, and nothing that is none of the caller's business. */
export function expectProblem(response: Response, status: number): Problem {
  expect(response.status, response.text).toBe(status)
  expect(response.type).toBe('application/problem+json')
  const problem = problemSchema.strict().parse(response.body)
  expect(problem.status).toBe(status)
  expect(problem.requestId).toMatch(/^[0-9a-f-]{36}$/)
  expect(JSON.stringify(response.body)).not.toMatch(
    /node_modules|\bat .+:\d+:\d+|SELECT |INSERT |UPDATE |mysql|drizzle/i,
  )
  return problem
}

/** A problem without the one part that differs from request to request. */
export const withoutId = ({ requestId: _requestId, ...rest }: Problem) => rest
