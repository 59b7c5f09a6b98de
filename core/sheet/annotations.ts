import type { Annotations } from './document.ts';
import { at, textAt } from './entries.ts';
import type { Entry } from './read-yaml.ts';

/** Label, symbol, digits, note and source of anything that may carry them. */
export function annotations(entry: Entry): Annotations {
  const [label, symbol, note, source] = ['label', 'symbol', 'note', 'source'].map((key) => textAt(entry, key));
  const digits = at(entry, 'digits');
  return {
    ...(label === undefined ? {} : { label }),
    ...(symbol === undefined ? {} : { symbol }),
    ...(note === undefined ? {} : { note }),
    ...(source === undefined ? {} : { source }),
    ...(digits?.entry === 'scalar' && typeof digits.value === 'number' ? { digits: digits.value } : {}),
  };
}
