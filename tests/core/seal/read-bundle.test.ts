import { describe, expect, it } from 'vitest';
import type { Bundle } from '../../../core/seal/model.ts';
import { bundleText } from '../../../core/seal/seal-bundle.ts';
import { verifyBundle } from '../../../core/seal/verify-bundle.ts';
import { sameReport } from './sample-bundle.ts';
import { detail, failures, makeSample } from './sample-verification.ts';

const { text } = await makeSample();

describe('form', () => {
  const bad = async (file: string | Uint8Array): Promise<string> => {
    const verification = await verifyBundle(file, sameReport);
    expect(failures(verification)).toEqual(['Form of the file: invalid']);
    return detail(verification, 'Form of the file');
  };

  it.each<[string, (good: string) => string]>([
    ['a trailing space', (good) => `${good} `],
    ['a second line feed', (good) => `${good}\n`],
    ['no line feed', (good) => good.trimEnd()],
    ['a carriage return', (good) => `${good.trimEnd()}\r\n`],
    ['a leading space', (good) => ` ${good}`],
    ['indentation', (good) => `${JSON.stringify(JSON.parse(good), null, 2)}\n`],
    ['an escaped letter', (good) => good.replace('Force on a run', '\\u0046orce on a run')],
    ['a number spelt otherwise', (good) => good.replace('"value":533.75', '"value":533.750')],
    ['a member given twice', (good) => good.replace('"title":', '"title":"Another title","title":')],
    [
      'another order of members',
      (good) => {
        const { antinode, ...rest } = JSON.parse(good) as Bundle;
        return `${JSON.stringify({ ...rest, antinode })}\n`;
      },
    ],
  ])('%s is refused, though the content is the same', async (_, change) => {
    const changed = change(text);
    expect(changed).not.toBe(text);
    expect(await bad(changed)).toContain('canonical form');
  });

  it.each<[string, string | Uint8Array, string]>([
    ['nothing', '', 'not JSON'],
    ['prose', 'a bundle', 'not JSON'],
    ['null', 'null\n', 'not the shape'],
    ['a list', '[]\n', 'not the shape'],
    ['an empty object', '{}\n', 'not the shape'],
    ['bytes that are not UTF-8', Uint8Array.of(0x7b, 0xff, 0x7d), 'not UTF-8'],
    ['a deep list', '['.repeat(1_000_000), 'not JSON'],
    ['a deep list that is closed', '['.repeat(50_000) + ']'.repeat(50_000), 'not the shape'],
  ])('%s is refused', async (_, file, reason) => {
    expect(await bad(file)).toContain(reason);
  });

  it('a byte order mark is refused', async () => {
    expect(await bad(new TextEncoder().encode(`\ufeff${text}`))).toContain('not JSON');
  });

  it.each<[string, (bundle: Bundle) => object]>([
    ['an extra member', (bundle) => ({ ...bundle, note: 'extra' })],
    ['an extra member in the manifest', (bundle) => ({ ...bundle, manifest: { ...bundle.manifest, note: '' } })],
    [
      'an extra member in a key',
      (bundle) => ({ ...bundle, keys: { ...bundle.keys, server: { ...bundle.keys.server, d: '' } } }),
    ],
    ['another version of the format', (bundle) => ({ ...bundle, antinode: 'bundle/2' })],
    ['a missing log', ({ log: _, ...bundle }) => bundle],
    ['a member named __proto__', (bundle) => ({ ...bundle, ['__proto__']: {} })],
  ])('%s is refused', async (_, change) => {
    expect(await bad(bundleText(change(JSON.parse(text) as Bundle) as Bundle))).toContain('not the shape');
  });

  it('text that is not Unicode is refused', async () => {
    expect(await bad(text.replace('Force on a run', '\\ud800'))).toContain('not Unicode');
  });

  it('a file of very many tiny values is refused before its faults are counted', async () => {
    const crowded = text.replace('"files":[', `"files":[${'1,'.repeat(1_000_000)}`);
    const verification = await verifyBundle(crowded, sameReport);
    expect(failures(verification)).toEqual(['Form of the file: not allowed']);
  });

  it('a huge file is refused unread', async () => {
    const verification = await verifyBundle(' '.repeat(20_000_001), sameReport);
    expect(failures(verification)).toEqual(['Form of the file: not allowed']);
    expect(detail(verification, 'Form of the file')).toBe('it is larger than 20 MB');
  });
});
