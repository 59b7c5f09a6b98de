import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { NewRemark, Person, RevisionSummary, Role } from '../../schemas/api.ts';
import { people } from '../db/schema/people.ts';
import { PACKAGE_ROOT } from '../places.ts';
import type { Context } from '../services/context.ts';
import { createPerson } from '../services/people.ts';
import { pushSheet } from '../services/push.ts';
import { raiseRemark } from '../services/remarks.ts';
import { addMember, createStudy } from '../services/studies.ts';
import { moveRevision } from '../services/transitions.ts';

/** Everyone and everything here is invented. */
export const DEMO_PASSWORD = 'antinode-demo';
const STUDY = { id: 'th-3', title: 'Tarn Hollow Station, unit TH-3', place: 'Tarn Hollow, Upper Fell' };
const SHEET = 'discharge-run-force.yaml';
/** A second sheet, with the files that it uses: pushed, and not handed over yet. */
const RANGE_SHEET = ['discharge-run-range.yaml', 'basis.yaml', 'conditions.csv'];

export interface DemoPerson {
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly password: string;
}

const PEOPLE: readonly DemoPerson[] = [
  { name: 'Maren Aldous', email: 'maren.aldous@tarnhollow.example', role: 'engineer', password: DEMO_PASSWORD },
  { name: 'Idris Kestrel', email: 'idris.kestrel@tarnhollow.example', role: 'checker', password: DEMO_PASSWORD },
  { name: 'Solveig Brandt', email: 'solveig.brandt@tarnhollow.example', role: 'approver', password: DEMO_PASSWORD },
  { name: 'Tomas Reyes', email: 'tomas.reyes@tarnhollow.example', role: 'reader', password: DEMO_PASSWORD },
];

const REMARKS: readonly NewRemark[] = [
  {
    path: 'atmosphere',
    weight: 'question',
    text: 'Site altitude 460 m: is 13.9 psia the yearly mean or the winter value?',
  },
  {
    path: 'inputs/dp_m',
    weight: 'must fix',
    text: 'Percent of which pressure: line mean or stage discharge? Name it in the label.',
  },
];

/** Fills an empty database with the demo study, in check and with two remarks; a database in use is left as it is. */
export async function seedDemo(context: Context): Promise<readonly DemoPerson[]> {
  if ((await context.db.$count(people)) > 0) return PEOPLE;
  await createStudy(context, STUDY);
  const created = new Map<Role, Person>();
  for (const { name, email, role, password } of PEOPLE) {
    const person = await createPerson(context, { name, email, password, isDemo: true });
    await addMember(context, STUDY.id, person, role);
    created.set(role, person);
  }
  const [author, checker] = [created.get('engineer'), created.get('checker')];
  if (author !== undefined && checker !== undefined) await pushExamples(context, author, checker);
  return PEOPLE;
}

async function pushExamples(context: Context, author: Person, checker: Person): Promise<void> {
  const first = await pushExample(context, author, [SHEET]);
  await pushExample(context, author, RANGE_SHEET);
  if (first === null) return;
  const { number, revision } = first;
  const ref = { study: STUDY.id, number, revision };
  await moveRevision(context, author, ref, { move: 'hand over', note: '', password: DEMO_PASSWORD });
  for (const remark of REMARKS) await raiseRemark(context, checker, ref, remark);
}

/** Pushes a sheet of the examples with the files beside it; nothing where the package carries no examples. */
async function pushExample(
  context: Context,
  author: Person,
  names: readonly string[],
): Promise<RevisionSummary | null> {
  const texts = await Promise.all(
    names.map((name) => readFile(join(PACKAGE_ROOT, 'examples/tarn-hollow', name), 'utf8').catch(() => null)),
  );
  const files = names.flatMap((name, i) => {
    const text = texts[i];
    return typeof text === 'string' ? [{ name, text }] : [];
  });
  const [sheet] = files;
  if (sheet === undefined || files.length < names.length) return null;
  const { report } = await context.pool.evaluate({ entry: sheet.name, files });
  if (report === null) throw new Error(`the example ${sheet.name} does not evaluate`);
  return pushSheet(context, author, STUDY.id, { entry: sheet.name, files, report });
}
