import { beforeAll, describe, expect, it } from 'vitest';
import { CORE_VERSION } from '../../core/version.ts';
import { ensureBuilt, EXAMPLE, makeWorkplace, runBuilt, runBuiltInto } from './harness.ts';
import { sheetText } from './sheets.ts';

const { cli, write, read, folder } = makeWorkplace();

beforeAll(ensureBuilt, 180_000);

describe('the built program', () => {
  it('says its version', async () => {
    expect(await runBuilt(['--version'], folder)).toEqual({ status: 0, out: `${CORE_VERSION}\n`, err: '' });
  });

  it('runs the example just as the sources do', async () => {
    const built = await runBuilt(['run', EXAMPLE, '--format', 'json'], folder);
    expect(built.status).toBe(0);
    expect(built.out).toBe((await cli(['run', EXAMPLE, '--format', 'json'])).out);
    expect((await runBuilt(['run', EXAMPLE], folder)).out).toContain('Force on run 3 below its limit');
  });

  it('ends with the status of the sheet', async () => {
    await write('sheet.yaml', sheetText());
    await write('wrong.yaml', sheetText({ steps: ['x: 2*nothing'] }));
    const statuses = [
      await runBuilt(['run', 'sheet.yaml'], folder),
      await runBuilt(['run', 'sheet.yaml', '--set', 'F_lim=1000 lbf'], folder),
      await runBuilt(['run', 'wrong.yaml'], folder),
      await runBuilt(['run'], folder),
      await runBuilt(['whoami'], folder),
    ].map(({ status }) => status);
    expect(statuses).toEqual([0, 1, 2, 3, 4]);
  });

  it('writes one file of HTML', async () => {
    const { status, out } = await runBuilt(['run', EXAMPLE, '--format', 'html', '--out', 'report.html'], folder);
    expect({ status, out }).toEqual({ status: 0, out: '' });
    const html = await read('report.html');
    expect(html).toMatch(/^<!doctype html>[^]*<math [^]*<\/html>\n$/);
    expect(html).toContain('url(data:font/woff2;base64,');
  });

  it('has every command', async () => {
    await write('new.yaml', '');
    const commands = [
      ['functions', 'pipe_bore'],
      ['units', '905', 'psia'],
      ['new', 'study', 'made'],
      ['lint', 'sheet.yaml'],
      ['explain', EXAMPLE, 'F'],
      ['compare', EXAMPLE, EXAMPLE],
      ['completion', 'bash'],
      ['run', EXAMPLE, '--sensitivity'],
      ['logout'],
      ['serve', '--help'],
    ];
    for (const command of commands) expect((await runBuilt(command, folder)).status).toBe(0);
    expect((await runBuilt(['verify', 'new.yaml'], folder)).status).toBe(2);
  });

  it('ends in peace when its reader has seen enough', async () => {
    // The report is longer than a pipe holds, so the program is still writing when the pipe is closed.
    const { status, out } = await runBuiltInto('head -c 15', ['run', EXAMPLE, '--format', 'html'], folder);
    expect({ status, out }).toEqual({ status: 0, out: '<!doctype html>' });
  });
});
