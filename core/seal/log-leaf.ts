import { canonicalJson } from './canonical-json.ts';
import { leafHash } from './merkle.ts';
import type { LogEvent } from './model.ts';

/** The log's leaf of an event: over its canonical JSON, index included, so that an event fits one place only. */
export function logLeaf(event: LogEvent): string {
  return leafHash(canonicalJson(event));
}
