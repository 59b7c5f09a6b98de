import type { Role, StudySummary } from '../../schemas/api.ts';
import { CommandFailure, EXIT } from '../exit-status.ts';
import { requireApi } from './api.ts';
import type { Credentials } from './credentials.ts';

/** The study of the person, where there is only one, or only one in which they have the role. */
export async function onlyStudy(credentials: Credentials, role?: Role): Promise<string> {
  const studies = await requireApi<StudySummary[]>({ ...credentials, path: '/studies' });
  const mine = studies.filter(({ roles }) => role === undefined || roles.includes(role));
  const [only] = mine;
  if (only !== undefined && mine.length === 1) return only.study;
  const who = role === undefined ? 'in' : `${role === 'engineer' || role === 'approver' ? 'an' : 'a'} ${role} of`;
  throw new CommandFailure(
    EXIT.usage,
    `you are ${who} ${only === undefined ? 'no study' : 'several studies'}`,
    mine.map(({ study, title }) => `--study ${study}  (${title})`),
  );
}
