import { describe, expect, it } from 'vitest';
import { EMAILS, eventsOf, logOf, sampleManifest, STORY, type Deed } from './sample-bundle.ts';
import { detail, failures, makeSample } from './sample-verification.ts';

const { keys, parts, verifySealed, withLog } = await makeSample();

describe('the log', () => {
  it('of another tree is invalid', async () => {
    const { entries } = await logOf(eventsOf(parts.manifest), keys.server, { others: 'another tree' });
    const verification = await verifySealed({ log: { head: parts.log.head, entries } });
    expect(failures(verification)).toEqual(
      ['1, “pushed”', '3, “handed over”', '5, “checked”', '7, “approved”'].map(
        (entry) => `Log entry ${entry}: invalid`,
      ),
    );
  });

  it('with an altered event is invalid', async () => {
    const entries = parts.log.entries.map(({ event, proof }) => ({ event: { ...event, note: 'later' }, proof }));
    const verification = await verifySealed({ log: { ...parts.log, entries } });
    expect(failures(verification)).toContain('Log entry 1, “pushed”: invalid');
  });

  it('with a head of somebody else is not allowed', async () => {
    const log = await logOf(eventsOf(parts.manifest), keys.author);
    const verification = await verifySealed({ log });
    expect(failures(verification)).toContain('Head of the log: not allowed');
    expect(failures(verification)).toContain('Log entry 1, “pushed”: invalid');
  });

  it('about another revision is not allowed', async () => {
    const other = eventsOf(sampleManifest({ revision: 'A' }));
    const verification = await verifySealed({ log: await logOf(other, keys.server) });
    expect(failures(verification)).toContain('Log entry 7, “approved”: not allowed');
  });

  it.each<[string, readonly Deed[]]>([
    ['without the approval', STORY.slice(0, 3)],
    ['without the check', STORY.filter(([event]) => event !== 'checked')],
    ['without the push', STORY.slice(1)],
    ['with an event that no rule knows', [...STORY, ['deleted', EMAILS.author, '11:30']]],
    ['returned at the end', [...STORY.slice(0, 3), ['returned', EMAILS.approver, '11:00']]],
    ['empty', []],
  ])('%s does not tell the story of an approved revision', async (_, deeds) => {
    expect(failures(await verifySealed(await withLog(deeds)))).toContain('Story of the revision: not allowed');
  });

  it.each(['pushed', 'handed over', 'checked', 'approved'])('in which another person %s disagrees', async (name) => {
    const deeds = STORY.map(([event, actor, clock]): Deed => [event, event === name ? 'eve@x.example' : actor, clock]);
    expect(failures(await verifySealed(await withLog(deeds)))).toEqual(['Log and signatures agree: not allowed']);
  });

  it('with entries out of order is not allowed', async () => {
    const [first, second, ...rest] = parts.log.entries;
    if (!first || !second) throw new Error('an entry is missing');
    const verification = await verifySealed({ log: { ...parts.log, entries: [second, first, ...rest] } });
    expect(failures(verification)).toContain('Times in the log: not allowed');
  });

  it('with a head older than its events is not allowed', async () => {
    const verification = await verifySealed(await withLog(STORY, { time: '2026-03-02T10:59:59Z' }));
    expect(failures(verification)).toEqual(['Times in the log: not allowed']);
  });

  it('that records a signature before it was given is not allowed', async () => {
    const deeds = STORY.map(([event, actor, clock]): Deed => [event, actor, event === 'checked' ? '09:30' : clock]);
    const verification = await verifySealed(await withLog(deeds));
    expect(failures(verification)).toEqual(['Times in the log: not allowed']);
    expect(detail(verification, 'Times in the log')).toBe('the checker signed after the log says so');
  });
});
