import { Option } from 'commander';

/** The form of an answer that both people and programs read. */
export function jsonFormat(): Option {
  return new Option('--format <format>', 'form of the answer').choices(['text', 'json']).default('text');
}

/** Values of an option that may be given again. */
export function collect(value: string, previous: readonly string[]): string[] {
  return [...previous, value];
}
