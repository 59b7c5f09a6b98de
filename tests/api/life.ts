import type { Move, RevisionDetail } from '../../schemas/api.ts';
import type { RunningServer } from '../../server/start.ts';
import {
  APPROVER,
  AUTHOR,
  CHECKER,
  PASSWORD,
  pushOf,
  sheetText,
  signIn,
  STUDY,
  type Answer,
  type Client,
  type SheetParts,
} from './site.ts';

/** Author, checker and approver, each in a browser of their own. */
export interface Cast {
  readonly author: Client;
  readonly checker: Client;
  readonly approver: Client;
}

export async function castOf(server: RunningServer): Promise<Cast> {
  return {
    author: await signIn(server, AUTHOR),
    checker: await signIn(server, CHECKER),
    approver: await signIn(server, APPROVER),
  };
}

export function move(
  by: Client,
  at: string,
  name: Move,
  note = '',
  password: string | undefined = PASSWORD,
): Promise<Answer> {
  const body = { move: name, note, ...(name === 'return' || password === undefined ? {} : { password }) };
  return by.call('POST', `${STUDY}/${at}/transitions`, body);
}

export async function detailOf(by: Client, at: string): Promise<RevisionDetail> {
  return (await by.call('GET', `${STUDY}/${at}`)).body as unknown as RevisionDetail;
}

/** Marks every block that is not marked yet. */
export async function markAll(by: Client, at: string): Promise<void> {
  const { report, marks } = await detailOf(by, at);
  const marked = new Set(marks.map(({ path }) => path));
  for (const { path, digest } of report.sections.flatMap(({ blocks }) => blocks)) {
    if (!marked.has(path)) await by.call('PUT', `${STUDY}/${at}/marks`, { path, digest });
  }
}

/** Brings a sheet all the way to approval, and gives its bundle. */
export async function approvedBundle(cast: Cast, parts: SheetParts): Promise<string> {
  const pushed = await cast.author.call('POST', STUDY, pushOf(sheetText(parts)));
  return approved(cast, `${String(pushed.body['number'])}/${String(pushed.body['revision'])}`);
}

/** Brings a pushed revision to approval, and gives its bundle. */
export async function approved({ author, checker, approver }: Cast, at: string): Promise<string> {
  await move(author, at, 'hand over');
  await markAll(checker, at);
  await move(checker, at, 'close check');
  await move(approver, at, 'approve');
  return (await approver.call('GET', `${STUDY}/${at}/bundle`)).text;
}
