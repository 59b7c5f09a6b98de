import { describe, expect, it } from 'vitest';
import { normaliseUserCode } from '../../../web/features/device/user-code.ts';
import { safeNext } from '../../../web/app/paths.ts';
import { formatDay, formatTime } from '../../../web/lib/dates.ts';
import { count, initials, shortName } from '../../../web/lib/words.ts';

describe('dates', () => {
  it('are ISO with the weekday, and say their zone', () => {
    expect(formatDay('2026-11-27T12:00:00Z', 'UTC')).toBe('2026-11-27 Fri');
    expect(formatTime('2026-11-27T12:05:00Z', 'UTC')).toBe('2026-11-27 Fri 12:05 UTC');
  });

  it('are those of the reader: a day may turn between two zones', () => {
    expect(formatDay('2026-11-27T23:30:00Z', 'Europe/Berlin')).toBe('2026-11-28 Sat');
    expect(formatTime('2026-11-27T00:05:00Z', 'America/Denver')).toMatch(/^2026-11-26 Thu 17:05 /);
  });

  it('show text that is no date as it is', () => {
    expect(formatDay('soon')).toBe('soon');
  });
});

describe('words', () => {
  it('count, shorten and abbreviate', () => {
    expect([count(1, 'hold'), count(2, 'hold')]).toEqual(['1 hold', '2 holds']);
    expect([shortName('Marek Aldous'), shortName('Aldous')]).toEqual(['M. Aldous', 'Aldous']);
    expect([initials('Ines van Kestrel'), initials('Ines')]).toEqual(['IK', 'I']);
  });

  it('read a user code however it is typed', () => {
    for (const typed of ['WDJB-MJHT', 'wdjbmjht', ' wdjb mjht ']) expect(normaliseUserCode(typed)).toBe('WDJB-MJHT');
  });
});

describe('safeNext', () => {
  it('leads only to pages of this site', () => {
    expect(safeNext('/studies/th-3?view=files')).toBe('/studies/th-3?view=files');
    for (const next of [null, '', 'https://example.org', '//example.org', '/\\example.org', 'javascript:alert(1)']) {
      expect(safeNext(next)).toBe('/');
    }
  });
});
