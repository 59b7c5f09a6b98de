import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { Suspense } from 'react';
import { MemoryRouter } from 'react-router';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import type { RevisionDetail } from '../../../schemas/api.ts';
import { RevisionView } from '../../../web/features/revision/revision-view.tsx';
import { Toaster } from '../../../web/ui/toaster.tsx';
import { stubBrowser } from '../browser-stubs.ts';
import { CHECKER, markOn, sampleRevision } from '../fixtures/revision.ts';

const REFERENCE = { study: 'th-3', number: 'TH3-C-104', revision: 'B' };
const BASE = '/api/studies/th-3/sheets/TH3-C-104/B';

/** The server of these tests: what it knows, how it answers changes, and what it was asked. */
let detail: RevisionDetail;
let refuse: { readonly status: number; readonly code: string; readonly detail: string } | null;
const asked: string[] = [];

beforeEach(() => {
  detail = sampleRevision();
  refuse = null;
  asked.length = 0;
  localStorage.clear();
  window.location.hash = '';
  stubBrowser();
  vi.stubGlobal('fetch', (path: string, init?: RequestInit) =>
    Promise.resolve(serve(path, init?.method ?? 'GET', init)),
  );
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
});

function serve(path: string, method: string, init?: RequestInit): Response {
  if (method === 'GET') return Response.json(detail);
  asked.push(`${method} ${path.slice(BASE.length)}`);
  if (refuse !== null)
    return Response.json({ type: 'about:blank', title: '', request: '', ...refuse }, { status: refuse.status });
  if (method === 'DELETE') {
    detail = { ...detail, marks: [] };
    return new Response(null, { status: 204 });
  }
  const body = JSON.parse(typeof init?.body === 'string' ? init.body : '{}') as Record<string, string>;
  if (path.endsWith('/marks')) {
    const mark = markOn(body['path'] ?? '');
    const marks = { ...detail.summary.marks, marked: detail.summary.marks.marked + 1 };
    detail = { ...detail, marks: [...detail.marks, mark], summary: { ...detail.summary, marks } };
    return Response.json(mark);
  }
  const remark = {
    ...body,
    id: 'remark-2',
    person: CHECKER,
    time: '2026-12-01T08:00:00.000Z',
    state: 'open',
    replies: [],
    etag: '"1"',
    revision: 'B',
  };
  detail = { ...detail, remarks: [...detail.remarks, remark as unknown as RevisionDetail['remarks'][number]] };
  return Response.json(remark, { status: 201 });
}

async function show(): Promise<HTMLElement> {
  const queryClient = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  render(
    <QueryClientProvider client={queryClient}>
      <MemoryRouter>
        <Suspense fallback="loading">
          <RevisionView
            reference={REFERENCE}
            me={CHECKER}
            studyTitle="Tarn Hollow"
            tab="report"
            file={null}
            onFile={() => undefined}
          />
        </Suspense>
      </MemoryRouter>
      <Toaster />
    </QueryClientProvider>,
  );
  return screen.findByRole('article', { name: /^TH3-C-104/ });
}

function markButton(label: string): HTMLElement {
  return screen.getByRole('button', { name: `Mark ${label}` });
}

describe('marks', () => {
  it('show at once, are sent with the digest of their block, and announce themselves', async () => {
    await show();
    const button = markButton('Discharge temperature');
    expect(button.getAttribute('aria-pressed')).toBe('false');
    fireEvent.click(button);
    await waitFor(() => expect(markButton('Discharge temperature').getAttribute('aria-pressed')).toBe('true'));
    expect(asked).toEqual(['PUT /marks']);
    expect(screen.getByTestId('spoken').textContent).toBe('Marked: Discharge temperature');
    expect(screen.getByText(/^2 of \d+ blocks marked/)).toBeDefined();
  });

  it('roll back with a message when the server refuses them', async () => {
    await show();
    refuse = { status: 409, code: 'digest-differs', detail: 'The block has changed since you read it.' };
    fireEvent.click(markButton('Discharge temperature'));
    const alert = await screen.findByText(/The mark was taken back: The block has changed/);
    expect(alert).toBeDefined();
    expect(markButton('Discharge temperature').getAttribute('aria-pressed')).toBe('false');
    expect(screen.getByText(/^1 of \d+ blocks marked/)).toBeDefined();
  });

  it('are taken back by the one who made them', async () => {
    await show();
    fireEvent.click(markButton('Discharge pressure'));
    await waitFor(() => expect(markButton('Discharge pressure').getAttribute('aria-pressed')).toBe('false'));
    expect(asked).toEqual(['DELETE /marks?path=inputs%2Fp_d']);
  });

  it('are made from the keyboard', async () => {
    await show();
    fireEvent.keyDown(document.body, { key: 'j' });
    fireEvent.keyDown(document.body, { key: 'm' });
    await waitFor(() => expect(markButton('Atmospheric pressure').getAttribute('aria-pressed')).toBe('true'));
    expect(window.location.hash).toBe('#atmosphere');
  });

  it('can’t be made by one who may not', async () => {
    detail = { ...detail, may: { ...detail.may, mark: false } };
    await show();
    expect(screen.queryByRole('button', { name: /^Mark / })).toBeNull();
    expect(screen.getByRole('img', { name: 'marked by Ines Kestrel, 2026-11-30 Mon' })).toBeDefined();
  });
});

describe('remarks', () => {
  const KEY = 'antinode:draft:th-3/TH3-C-104/B:atmosphere';

  async function compose(text: string): Promise<HTMLElement> {
    fireEvent.keyDown(document.body, { key: 'j' });
    fireEvent.keyDown(document.body, { key: 'r' });
    const box = await screen.findByLabelText('Remark on Atmospheric pressure');
    fireEvent.change(box, { target: { value: text } });
    return box;
  }

  it('are kept as drafts, and stand there again after a reload', async () => {
    await show();
    await compose('Yearly mean?');
    expect(localStorage.getItem(KEY)).toBe('Yearly mean?');
    cleanup();
    await show();
    expect(screen.getByLabelText<HTMLTextAreaElement>('Remark on Atmospheric pressure').value).toBe('Yearly mean?');
  });

  it('show when sent, and the draft goes', async () => {
    await show();
    const box = await compose('Yearly mean?');
    fireEvent.keyDown(box, { key: 'Enter', ctrlKey: true });
    await waitFor(() => expect(screen.queryByLabelText('Remark on Atmospheric pressure')).toBeNull());
    expect(screen.getByText('Yearly mean?')).toBeDefined();
    expect(localStorage.getItem(KEY)).toBeNull();
    expect(asked).toEqual(['POST /remarks']);
  });

  it('roll back when they are refused, and nothing typed is lost', async () => {
    await show();
    refuse = { status: 403, code: 'not-allowed', detail: 'The check is closed.' };
    const box = await compose('Yearly mean?');
    fireEvent.keyDown(box, { key: 'Enter', metaKey: true });
    await screen.findByText(/The remark was not sent, its text is kept: The check is closed/);
    expect(screen.getByLabelText<HTMLTextAreaElement>('Remark on Atmospheric pressure').value).toBe('Yearly mean?');
    expect(document.querySelectorAll('[aria-label^="Remark, "]')).toHaveLength(1);
  });
});

describe('moves', () => {
  it('that are refused say why, on the strip and in their dialog', async () => {
    await show();
    const strip = screen.getByRole('region', { name: 'State of the revision' });
    expect(strip.textContent).toContain('1 must-fix remark is not resolved');
    fireEvent.click(screen.getByRole('button', { name: 'Close the check' }));
    const dialog = screen.getByRole('dialog', { name: 'Close the check of this revision' });
    expect(dialog.textContent).toContain('1 must-fix remark is not resolved');
    expect(within(dialog).queryByLabelText('Your password')).toBeNull();
  });

  it('that sign ask for the password, and a wrong one keeps the dialog and its note', async () => {
    detail = { ...detail, may: { ...detail.may, moves: [{ move: 'close check', allowed: true, why: '' }] } };
    await show();
    refuse = { status: 403, code: 'wrong-password', detail: 'The password is not right.' };
    fireEvent.click(screen.getByRole('button', { name: 'Close the check' }));
    fireEvent.change(screen.getByLabelText('Note to the approver'), { target: { value: 'See the hold.' } });
    fireEvent.change(screen.getByLabelText('Your password'), { target: { value: 'wrong' } });
    fireEvent.click(screen.getByRole('button', { name: 'Sign and close the check' }));
    expect((await within(screen.getByRole('dialog')).findByRole('alert')).textContent).toContain(
      'The password is not right.',
    );
    expect(screen.getByLabelText<HTMLTextAreaElement>('Note to the approver').value).toBe('See the hold.');
  });

  it('that do not sign ask for the reason alone', async () => {
    await show();
    fireEvent.click(screen.getByRole('button', { name: 'Return to author' }));
    expect(screen.getByLabelText<HTMLTextAreaElement>('What is to be done').required).toBe(true);
    expect(screen.queryByLabelText('Your password')).toBeNull();
  });
});
