import { CommandFailure, EXIT } from '../exit-status.ts';

/** A revision of a sheet, as people name it: `TH3-C-102@B`. */
export interface Reference {
  readonly number: string;
  readonly revision: string;
}

export function referenceOf(text: string): Reference {
  const at = text.lastIndexOf('@');
  const [number, revision] = [text.slice(0, at), text.slice(at + 1).replace(/#.*$/, '')];
  if (at > 0 && number !== '' && revision !== '') return { number, revision };
  throw new CommandFailure(EXIT.usage, `\`${text}\` does not name a revision`, [
    'write `NUMBER@REVISION`: `TH3-C-102@B`',
  ]);
}

/** Where the server has a revision. */
export function revisionPath(study: string, { number, revision }: Reference): string {
  return `/studies/${[study, 'sheets', number, revision].map(encodeURIComponent).join('/')}`;
}
