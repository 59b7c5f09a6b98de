import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openPage, openSite, PEOPLE, signIn, type Site } from './site.ts';

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

const PAGES = [
  ['desk', '/', 'Waits on you'],
  ['study', '/studies/th-3', 'Tarn Hollow Station, unit TH-3'],
  ['revision', '/studies/th-3/sheets/TH3-C-104/A', 'Second-stage discharge lateral, shaking force'],
  ['newest revision', '/studies/th-3/sheets/TH3-C-104', 'Second-stage discharge lateral, shaking force'],
  ['tokens', '/account/tokens', 'Personal tokens'],
  ['device', '/device', 'Sign in a terminal'],
  ['verify', '/verify', 'Verify'],
] as const;

let site: Site;
beforeAll(async () => {
  site = await openSite();
});
afterAll(() => site.close());

interface AxeViolation {
  readonly id: string;
  readonly nodes: readonly { readonly html: string }[];
}

async function violations(page: Page): Promise<string[]> {
  await page.evaluate(axeSource);
  const found = await page.evaluate<readonly AxeViolation[]>(
    "axe.run(document, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] }).then((r) => r.violations)",
  );
  return found.map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 160) ?? ''}`);
}

describe.each(['light', 'dark'] as const)('in the %s theme', (colorScheme) => {
  it.each([1440, 390, 360])(
    'every page at %d px: shows itself, runs over no edge, and passes the accessibility rules',
    async (width) => {
      const { page, complaints, close } = await openPage(site, {
        colorScheme,
        viewport: { width, height: 900 },
        reducedMotion: 'reduce',
      });
      await signIn(page, PEOPLE.checker);
      for (const [name, path, heading] of PAGES) {
        await page.goto(path);
        await page
          .getByRole('heading', { level: 1, name: new RegExp(heading, 'i') })
          .first()
          .waitFor();
        await page.waitForLoadState('networkidle');
        const over = await page.evaluate<number>('document.documentElement.scrollWidth - window.innerWidth');
        expect(`${name} runs over by ${Math.max(0, over)} px`).toBe(`${name} runs over by 0 px`);
        if (width !== 360) expect(await violations(page)).toEqual([]);
      }
      expect(complaints).toEqual([]);
      await close();
    },
  );
});

describe('without a sign-in', () => {
  it('a page of the study asks for it, and comes back to where one wanted to go', async () => {
    const { page, close } = await openPage(site);
    await page.goto('/studies/th-3');
    await page.getByLabel('E-mail').fill(PEOPLE.reader);
    await page.getByLabel('Password').fill('antinode-demo');
    await page.keyboard.press('Enter');
    await page.waitForURL('**/studies/th-3');
    await close();
  });

  it('a wrong password is told, and what was typed is kept', async () => {
    const { page, close } = await openPage(site);
    await page.goto('/sign-in');
    await page.getByLabel('E-mail').fill('nobody@tarnhollow.example');
    await page.getByLabel('Password').fill('wrong');
    await page.keyboard.press('Enter');
    await page
      .getByText(/password is wrong/)
      .first()
      .waitFor();
    expect(await page.getByLabel('E-mail').inputValue()).toBe('nobody@tarnhollow.example');
    await close();
  });
});

describe('drafts', () => {
  it('a remark that is being written survives a reload', async () => {
    const { page, close } = await openPage(site);
    await signIn(page, PEOPLE.checker);
    await page.goto('/studies/th-3/sheets/TH3-C-104/A');
    await page
      .getByRole('button', { name: /^Mark / })
      .first()
      .waitFor();
    await page.keyboard.press('j');
    await page.keyboard.press('r');
    const composer = page.locator('textarea').first();
    await composer.fill('Which edition of the data sheet?');
    await page.reload();
    await page.locator('textarea').first().waitFor();
    expect(await page.locator('textarea').first().inputValue()).toBe('Which edition of the data sheet?');
    await close();
  });
});
