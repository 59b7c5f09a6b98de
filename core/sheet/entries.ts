import type { Text } from './document.ts';
import type { Entry, EntryPair } from './read-yaml.ts';

/** What stands under a key of a mapping. */
export function at(entry: Entry, key: string): Entry | undefined {
  return pairsOf(entry).find((pair) => pair.key.text === key)?.value;
}

export function textAt(entry: Entry, key: string): Text | undefined {
  const found = at(entry, key);
  return found && textOf(found);
}

/** Text and numbers as they are written; an empty value, a truth value, a list or a mapping is none. */
export function textOf(entry: Entry): Text | undefined {
  if (entry.entry !== 'scalar' || entry.value === null || typeof entry.value === 'boolean') return undefined;
  return typeof entry.value === 'number' && !Number.isFinite(entry.value) ? undefined : entry.text;
}

export function textsOf(entry: Entry | undefined): Text[] {
  return itemsOf(entry).flatMap((item) => textOf(item) ?? []);
}

export function pairsOf(entry: Entry | undefined): readonly EntryPair[] {
  return entry?.entry === 'map' ? entry.pairs : [];
}

export function itemsOf(entry: Entry | undefined): readonly Entry[] {
  return entry?.entry === 'list' ? entry.items : [];
}
