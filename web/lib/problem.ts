import type { Problem } from '../../schemas/api.ts';

/** A request that the server refused, or that never reached it. `code` is stable; `detail` is for people. */
export class ApiProblem extends Error {
  readonly code: string;
  readonly status: number;
  readonly problem: Problem;

  constructor(problem: Problem) {
    super(problem.detail === '' ? problem.title : problem.detail);
    this.name = 'ApiProblem';
    this.code = problem.code;
    this.status = problem.status;
    this.problem = problem;
  }
}

/** The server could not be reached. Nothing is known of what it did. */
export function unreachable(): ApiProblem {
  return new ApiProblem({
    type: 'about:blank',
    title: 'The server can’t be reached',
    status: 0,
    detail: 'The server can’t be reached. What you have typed is kept; try again when the connection is back.',
    code: 'unreachable',
    request: '',
  });
}

/** The problem that a refused response carries, or one made from its status when it carries none. */
export async function problemOf(response: Response): Promise<ApiProblem> {
  const body: unknown = await response.json().catch(() => null);
  const given = isObject(body) ? body : {};
  return new ApiProblem({
    ...(given as Partial<Problem>),
    type: text(given['type'], 'about:blank'),
    title: text(given['title'], `The server answered ${response.status}`),
    status: response.status,
    detail: text(given['detail'], ''),
    code: text(given['code'], `http-${response.status}`),
    request: text(given['request'], response.headers.get('X-Request-Id') ?? ''),
  });
}

/** What a person is told of any failure: what happened, in words. */
export function wordsOf(error: unknown): string {
  if (error instanceof ApiProblem) return error.message;
  return error instanceof Error
    ? `Something went wrong in the viewer: ${error.message}`
    : 'Something went wrong in the viewer.';
}

export function hasCode(error: unknown, ...codes: readonly string[]): boolean {
  return error instanceof ApiProblem && codes.includes(error.code);
}

function text(value: unknown, otherwise: string): string {
  return typeof value === 'string' ? value : otherwise;
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
