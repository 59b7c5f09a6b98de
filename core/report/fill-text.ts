import { textValues } from '../sheet/text-values.ts';
import type { Printed } from '../units/printed.ts';
import type { DraftContext } from './draft.ts';
import { printInput } from './print-value.ts';
import { valueOf } from './values.ts';

/** Prose with the values of the sheet in the place of their names. */
export function fillText(
  text: string,
  context: DraftContext,
): { readonly markdown: string; readonly names: readonly string[] } {
  const values = textValues(text);
  let [markdown, at] = ['', 0];
  for (const { name, start, end } of values) {
    const named = valueOf(name, context.sheet);
    const written = text.slice(start, end);
    markdown +=
      text.slice(at, start) + (named ? inProse(printInput(named.value, named.typed, named.digits, context)) : written);
    at = end;
  }
  return { markdown: markdown + text.slice(at), names: values.map(({ name }) => name) };
}

const NO_BREAK_SPACE = '\u00A0';
const POWERS: Readonly<Record<string, string>> = { '^2': '²', '^3': '³', '^4': '⁴', '*': '·' };

/** A number with its unit that no line break parts, and no sign of which prose takes for its own. */
function inProse({ number, unit }: Printed): string {
  const sign = number.replaceAll('-', '−').replaceAll(' … ', ' to ');
  const plain = unit.replace(/\^[234](?!\d)|\*/g, (part) => POWERS[part] ?? part);
  return unit === '' ? sign : `${sign}${NO_BREAK_SPACE}${plain}`;
}
