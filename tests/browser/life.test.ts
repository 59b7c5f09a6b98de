import { readFile, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { command, EXAMPLE, openPage, openSite, PASSWORD, PEOPLE, signIn, type Site, type WatchedPage } from './site.ts';

const SHEET = '/studies/th-3/sheets/TH3-C-104';
/** The example with its hold closed: the vendor has answered. */
const CLOSED = EXAMPLE.replace("hold: Awaiting the cylinder vendor's valve flow areas", 'source: pulse');

let site: Site;
beforeAll(async () => {
  site = await openSite();
});
afterAll(() => site.close());

/** Does something as one person, in a browser of their own; the page complains of nothing but what is expected. */
async function as(email: string, act: (page: Page) => Promise<void>, expected: readonly unknown[] = []): Promise<void> {
  const watched: WatchedPage = await openPage(site);
  try {
    await signIn(watched.page, email);
    await act(watched.page);
    expect(watched.complaints).toEqual(expected);
  } finally {
    await watched.close();
  }
}

async function sign(page: Page, button: string, confirm: string): Promise<void> {
  await page.getByRole('button', { name: button, exact: true }).click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Your password').fill(PASSWORD);
  await dialog.getByRole('button', { name: confirm }).click();
  await dialog.waitFor({ state: 'hidden' });
}

async function tokenOf(page: Page): Promise<string> {
  await page.goto('/account/tokens');
  await page.getByLabel('What it is for').fill('Command line of the test');
  await page.locator('form').getByRole('button').click();
  const text = await page.getByText(/antn_/).first().textContent();
  return /antn_[A-Za-z0-9_-]+/.exec(text ?? '')?.[0] ?? '';
}

describe('from a sheet to a verified bundle', () => {
  let token = '';
  let bundle = '';

  it('the author sees the revision with its hold, and makes a token', () =>
    as(PEOPLE.author, async (page) => {
      await page.goto(`${SHEET}/A`);
      await page.getByRole('heading', { name: 'Second-stage discharge lateral, shaking force' }).waitFor();
      await page.getByText('can’t be approved while it is open').waitFor();
      expect(await page.locator('.katex').count()).toBeGreaterThan(30);
      expect(await page.locator('.katex math').count()).toBeGreaterThan(30);
      token = await tokenOf(page);
      expect(token).not.toBe('');
    }));

  it('the command line pushes the closed sheet as revision B', async () => {
    await writeFile(join(site.folder, 'discharge-run-force.yaml'), CLOSED);
    const pushed = await command(site, ['push', 'discharge-run-force.yaml'], token);
    expect(pushed).toMatchObject({ status: 0, out: 'TH3-C-104 revision B pushed to th-3\n' });
    const again = await command(site, ['push', 'discharge-run-force.yaml'], token);
    expect(again.status).toBe(4);
    expect(again.err).toContain('Nothing has changed');
  });

  it('the author hands it over, and answers the must-fix remark', () =>
    as(PEOPLE.author, async (page) => {
      await page.goto(`${SHEET}/B`);
      await sign(page, 'Hand over', 'Sign and hand over');
      const remark = page.getByRole('article', { name: /must fix/ });
      await remark.getByRole('button', { name: 'Answer' }).click();
      await remark.getByLabel('Answer to the remark').fill('Line mean, absolute.');
      await remark.getByLabel('Answer to the remark').press('Control+Enter');
      await remark.getByText('answered').waitFor();
    }));

  it('the checker cannot close the check before all is marked; then resolves, marks with the keys, and closes', () =>
    as(PEOPLE.checker, async (page) => {
      await page.goto('/');
      await page.getByText('1 must-fix remark answered: look again').click();
      await page.waitForURL(`**${SHEET}/B`);
      await page.getByRole('button', { name: 'Close the check' }).click();
      await page.getByRole('dialog').getByText('Not now.').waitFor();
      await page.getByRole('dialog').getByRole('button', { name: 'Close', exact: true }).last().click();

      for (const weight of [/must fix/, /question/]) {
        await page.getByRole('article', { name: weight }).getByRole('button', { name: 'Resolve' }).click();
        await page.getByRole('article', { name: weight }).waitFor({ state: 'detached' });
      }
      await page.goto(`${SHEET}/B`);
      await markAll(page);
      await sign(page, 'Close the check', 'Sign and close the check');
      await page.getByRole('region', { name: 'State of the revision' }).getByText('38 of 38 blocks marked').waitFor();
    }));

  it('the reader may look, and do nothing', () =>
    as(PEOPLE.reader, async (page) => {
      await page.goto(`${SHEET}/B`);
      await page.getByRole('heading', { name: 'Force on run 3' }).waitFor();
      expect(
        await page.getByRole('button', { name: /^(Approve|Return to author|Close the check|Hand over)$/ }).count(),
      ).toBe(0);
      expect(await page.getByRole('button', { name: /^Mark / }).count()).toBe(0);
    }));

  it('the approver signs, after a wrong password is refused, and downloads the bundle', () =>
    as(
      PEOPLE.approver,
      async (page) => {
        await page.goto(`${SHEET}/B`);
        await page.getByRole('button', { name: 'Approve', exact: true }).click();
        const dialog = page.getByRole('dialog');
        await dialog.getByLabel('Your password').fill('not the password');
        await dialog.getByRole('button', { name: 'Sign and approve' }).click();
        await dialog
          .getByText(/password is wrong/)
          .first()
          .waitFor();
        await dialog.getByLabel('Your password').fill(PASSWORD);
        await dialog.getByRole('button', { name: 'Sign and approve' }).click();
        await dialog.waitFor({ state: 'hidden' });
        const [download] = await Promise.all([
          page.waitForEvent('download'),
          page.getByRole('button', { name: /Bundle/ }).click(),
        ]);
        expect(download.suggestedFilename()).toBe('TH3-C-104-B.bundle.json');
        bundle = join(site.folder, download.suggestedFilename());
        await download.saveAs(bundle);
      },
      [expect.stringContaining('403')],
    ));

  it('the command line accepts the bundle, and refuses it with one byte changed anywhere', async () => {
    const verified = await command(site, ['verify', bundle]);
    expect(verified.out).toContain('valid: TH3-C-104 revision B');
    expect(verified.status).toBe(0);
    const text = await readFile(bundle, 'utf8');
    for (const share of [0.01, 0.2, 0.4, 0.6, 0.8, 0.99]) {
      const at = Math.floor(text.length * share);
      const changed = text.slice(0, at) + (text.charAt(at) === '1' ? '2' : '1') + text.slice(at + 1);
      await writeFile(join(site.folder, 'changed.json'), changed);
      const refused = await command(site, ['verify', 'changed.json']);
      expect(refused.status).toBeGreaterThan(0);
      expect(refused.out).toContain('refused: ');
    }
  });

  it('the viewer verifies the bundle in the browser, without a sign-in, and refuses a changed one', async () => {
    const { page, complaints, close } = await openPage(site);
    await page.goto('/verify');
    await page.locator('input[type=file]').setInputFiles(bundle);
    await page.getByText('Evaluated again').waitFor();
    expect(await page.locator('main').textContent()).toContain('TH3-C-104');
    await writeFile(
      join(site.folder, 'changed.json'),
      (await readFile(bundle, 'utf8')).replace('905 psig', '906 psig'),
    );
    await page.locator('input[type=file]').setInputFiles(join(site.folder, 'changed.json'));
    await page
      .getByText(/refused|not valid|does not hold/i)
      .first()
      .waitFor();
    expect(complaints).toEqual([]);
    await close();
  });
});

/** Walks all blocks with `j` and marks each with `m`, as a checker does. */
async function markAll(page: Page): Promise<void> {
  await page
    .getByRole('button', { name: /^Mark / })
    .first()
    .waitFor();
  const total = await page.getByRole('button', { name: /^Mark / }).count();
  expect(total).toBe(38);
  for (let i = 0; i < total; i += 1) {
    await page.keyboard.press('j');
    await page.keyboard.press('m');
  }
  await page.getByText(`${total} of ${total} blocks marked`).waitFor();
}
