import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { evaluateSheet } from '../../core/evaluate/evaluate-sheet.ts';
import type { Manifest } from '../../core/seal/model.ts';
import type { Push, RevisionDetail, RevisionValues } from '../../schemas/api.ts';
import type { RunningServer } from '../../server/start.ts';
import { approved, castOf, type Cast } from './life.ts';
import { pushOf, READER, sheetText, signIn, startSite, STUDY, type Client } from './site.ts';

let site: RunningServer;
let cast: Cast;
let author: Client;

beforeAll(async () => {
  site = await startSite();
  cast = await castOf(site);
  ({ author } = cast);
  await author.call('POST', STUDY, pushOf(sheetText({ number: 'T-1' })));
}, 60_000);

afterAll(() => site.stop());

async function valuesOf(revision: string): Promise<RevisionValues> {
  return (await author.call('GET', `${STUDY}/T-1/${revision}/values`)).body as unknown as RevisionValues;
}

const TAKER = `antinode: sheet/1
number: T-2
title: Taker
units: us
take: { F_1: T-1@A#F }
sections:
  - title: S
    steps: { twice: 2*F_1 to lbf }
`;

interface Lock {
  readonly digest: string;
  readonly quantities: RevisionValues['quantities'];
}

function taking(lock: Lock, text = TAKER): Push {
  const files = [
    { name: 'sheet.yaml', text },
    { name: 'antinode.lock.json', text: JSON.stringify({ antinode: 'lock/1', revisions: { 'T-1@A': lock } }) },
  ];
  const { report, diagnostics } = evaluateSheet({ entry: 'sheet.yaml', files });
  if (report === null) throw new Error(JSON.stringify(diagnostics));
  return { entry: 'sheet.yaml', files, report };
}

describe('values of a revision', () => {
  it('are read by members of the study', async () => {
    const reader = await signIn(site, READER);
    const { status, body } = await reader.call('GET', `${STUDY}/T-1/A/values`);
    expect(status).toBe(200);
    // 2 % of 914.7 psia on 2 in².
    expect(body).toMatchObject({ number: 'T-1', revision: 'A', state: 'pushed', newest: null });
    expect((body as unknown as RevisionValues).quantities['F']?.si).toBeCloseTo(0.02 * 914.7 * 2 * 4.4482216152605, 6);
  });

  it.each([`${STUDY}/T-1/Z/values`, `${STUDY}/T-9/A/values`, '/studies/none/sheets/T-1/A/values'])(
    'are not at %s',
    async (path) => {
      expect((await author.call('GET', path)).status).toBe(404);
    },
  );
});

describe('a sheet that takes them', () => {
  it('is refused where its lock has another value', async () => {
    const { manifestDigest, quantities } = await valuesOf('A');
    const F = { ...quantities['F'], unit: 'lbf', si: 999, axes: [] };
    const { status, body } = await author.call('POST', STUDY, taking({ digest: manifestDigest, quantities: { F } }));
    expect([status, body['code']]).toEqual([409, 'taken-differs']);
    expect(body['detail']).toContain('T-1@A#F is 224.6 lbf in the sheet, and 36.59 lbf on record');
  });

  it('is refused where it is pinned to another revision of that name', async () => {
    const { quantities } = await valuesOf('A');
    const { status, body } = await author.call(
      'POST',
      STUDY,
      taking({ digest: `sha256-${'0'.repeat(64)}`, quantities }),
    );
    expect([status, body['code']]).toEqual([409, 'taken-differs']);
  });

  it.each(['T-1@B#F', 'T-9@A#F'])('is refused where it takes %s, which is not there', async (from) => {
    const { manifestDigest, quantities } = await valuesOf('A');
    const reference = from.split('#')[0] ?? '';
    const files = [
      { name: 'sheet.yaml', text: TAKER.replace('T-1@A#F', from) },
      {
        name: 'antinode.lock.json',
        text: JSON.stringify({
          antinode: 'lock/1',
          revisions: { [reference]: { digest: manifestDigest, quantities } },
        }),
      },
    ];
    const { report } = evaluateSheet({ entry: 'sheet.yaml', files });
    const { status, body } = await author.call('POST', STUDY, { entry: 'sheet.yaml', files, report });
    expect([status, body['code']]).toEqual([409, 'taken-unknown']);
  });

  it('is kept with what it takes in its manifest', async () => {
    const { manifestDigest, quantities } = await valuesOf('A');
    const { status } = await author.call('POST', STUDY, taking({ digest: manifestDigest, quantities }));
    expect(status).toBe(201);
    const detail = (await author.call('GET', `${STUDY}/T-2/A`)).body as unknown as RevisionDetail;
    expect(Number(detail.report.quantities['twice']?.value)).toBeCloseTo(2 * 0.02 * 914.7 * 2, 9);
    await approved(cast, 'T-2/A');
    const bundle = JSON.parse((await author.call('GET', `${STUDY}/T-2/A/bundle`)).text) as { manifest: Manifest };
    expect(bundle.manifest.taken).toEqual([{ number: 'T-1', revision: 'A', digest: manifestDigest }]);
  });
});

describe('a later revision', () => {
  it('is told once it is approved', async () => {
    await author.call('POST', STUDY, pushOf(sheetText({ number: 'T-1', pressure: '800 psig' })));
    expect((await valuesOf('A')).newest).toBeNull();
    await approved(cast, 'T-1/B');
    expect((await valuesOf('A')).newest).toBe('B');
    expect((await valuesOf('B')).newest).toBeNull();
  });
});
