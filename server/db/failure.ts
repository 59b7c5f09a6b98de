import { DrizzleQueryError } from 'drizzle-orm/errors';

/** What may be logged of a failure. The message of a failed query holds its SQL and its values, so only the cause is told. */
export function loggable(error: unknown): { readonly message: string; readonly code?: unknown; readonly at: string } {
  if (!(error instanceof Error)) return { message: String(error), at: '' };
  const at = (error.stack ?? '')
    .split('\n')
    .filter((line) => /^\s+at /.test(line))
    .join('\n');
  if (!(error instanceof DrizzleQueryError)) return { message: error.message, at };
  const { cause } = error;
  const code = cause !== undefined && 'code' in cause ? cause.code : undefined;
  return { message: cause?.message ?? 'a query failed', code, at };
}

/** Whether a query failed because the row would break a constraint of uniqueness. */
export function isUniqueViolation(error: unknown): boolean {
  const cause = error instanceof DrizzleQueryError ? error.cause : undefined;
  return cause !== undefined && 'code' in cause && cause.code === '23505';
}
