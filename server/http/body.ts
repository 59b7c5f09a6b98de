import type { ErrorObject } from 'ajv';
import { Refusal } from '../problem.ts';

interface Validator<T> {
  (data: unknown): data is T;
  readonly errors?: readonly ErrorObject[] | null;
}

/** The body of a request, where it is what its JSON Schema says; else a refusal that names the first fault. */
export function bodyOf<T>(validate: Validator<T>, request: { readonly body?: unknown }): T {
  const body = request.body;
  if (validate(body)) return body;
  const [first] = validate.errors ?? [];
  const place = first?.instancePath.slice(1).replaceAll('/', '.') ?? '';
  const property: unknown = first?.params['additionalProperty'];
  const extra = typeof property === 'string' ? `: \`${property}\`` : '';
  throw new Refusal(
    'bad-body',
    `${place === '' ? 'the body' : `\`${place}\``} ${first?.message ?? 'is wrong'}${extra}`,
  );
}
