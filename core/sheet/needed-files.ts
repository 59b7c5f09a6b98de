import { at, textAt, textOf, textsOf } from './entries.ts';
import { LOCK_FILE, nameBeside } from './file-names.ts';
import { readYaml } from './read-yaml.ts';

/**
 * Names of the files that a sheet or a file of definitions reads beside itself, for a host to fetch before it evaluates.
 * What cannot be read names none; the evaluation says what is wrong with it.
 */
export function neededFiles(file: string, text: string): readonly string[] {
  const { root } = readYaml(file, text);
  if (root?.entry !== 'map') return [];
  const conditions = at(root, 'conditions');
  const table = conditions && (conditions.entry === 'scalar' ? textOf(conditions) : textAt(conditions, 'file'));
  const named = [...textsOf(at(root, 'use')), ...(table === undefined ? [] : [table])].map(({ text: name }) => name);
  if (at(root, 'take') !== undefined) named.push(LOCK_FILE);
  return [...new Set(named.flatMap((name) => nameBeside(file, name) ?? []))];
}
