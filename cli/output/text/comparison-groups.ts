import type {
  AxisChange,
  BlockMention,
  CheckChange,
  CheckState,
  Comparison,
  InputChange,
  ResultChange,
  TextChange,
} from '../../../core/report/comparison.ts';
import type { ValueChange } from '../../../core/report/value-change.ts';
import { percentText } from './percent.ts';
import { STANDING, utilisationText } from './working.ts';

export interface ChangeGroup {
  readonly title: string;
  readonly style?: 'red' | 'yellow' | 'green';
  readonly lines: readonly string[];
}

/** What changed, by its weight for the person who judges it; groups without an entry are left out. */
export function changeGroups(comparison: Comparison): ChangeGroup[] {
  const { newlyFailing, checks, holds, axes, inputs, formulas, results, added, removed, texts } = comparison;
  const groups: ChangeGroup[] = [
    { title: 'Newly failing', style: 'red', lines: newlyFailing.map(checkLine) },
    { title: 'Checks', lines: checks.map(checkLine) },
    { title: 'Holds opened', style: 'yellow', lines: holds.opened.map(({ label, reason }) => `◔ ${label}: ${reason}`) },
    { title: 'Holds closed', style: 'green', lines: holds.closed.map(({ label, reason }) => `${label}: ${reason}`) },
    { title: 'Axes', lines: axes.flatMap(axisLines) },
    { title: 'Inputs', lines: inputs.flatMap(inputLines) },
    {
      title: 'Formulas',
      lines: formulas.map(({ before, after, ...block }) => `${nameOf(block)}: ${before} → ${after}`),
    },
    { title: 'Results', lines: results.map(resultLine) },
    { title: 'Added', lines: added.map(mentionLine) },
    { title: 'Removed', lines: removed.map(mentionLine) },
    { title: 'Text', lines: texts.map(textLine) },
  ];
  return groups.filter(({ lines }) => lines.length > 0);
}

function checkLine({ label, before, after }: CheckChange): string {
  const [glyph, word] = STANDING[after.standing];
  const was = before === null ? 'new' : stateText(before, after);
  return `${label}: ${was} → ${stateText(after, before)} ${glyph} ${word}`;
}

/** Utilisations that differ only beyond two decimals are shown with more. */
function stateText(state: CheckState, other: CheckState | null): string {
  const { utilisation, at, points } = state;
  const isFine = utilisation !== null && other !== null && utilisationText(state) === utilisationText(other);
  const number =
    isFine && utilisation !== other.utilisation ? utilisation.toPrecision(6) : utilisationText(state).trim();
  const place = at === undefined || at === '' ? '' : ` at ${at}`;
  return `${number}${place}${points !== undefined && points.failed > 0 ? ` (${points.failed} of ${points.all} fail)` : ''}`;
}

function axisLines({ name, unit, added, removed }: AxisChange): string[] {
  const listed = (points: readonly (string | number)[]): string => {
    const shown = points.slice(0, MOST_PARTS).join(', ');
    const more = points.length > MOST_PARTS ? ` and ${points.length - MOST_PARTS} more` : '';
    return `${shown}${more}${unit === undefined ? '' : ` ${unit}`}`;
  };
  return [
    ...(added.length === 0 ? [] : [`${name}: ${listed(added)} added`]),
    ...(removed.length === 0 ? [] : [`${name}: ${listed(removed)} removed`]),
  ];
}

/** Cells shown of a column, gas or table; the JSON form has all. */
const MOST_PARTS = 8;

function inputLines({ before, after, change, parts, ...block }: InputChange): string[] {
  const name = nameOf(block);
  if (parts.length > 0) {
    const listed = parts.slice(0, MOST_PARTS).map((part) => `${part.part} ${part.before} → ${part.after}`);
    const more = parts.length > MOST_PARTS ? [`and ${parts.length - MOST_PARTS} more`] : [];
    const greatest = change === null ? '' : `; the largest change${measureText(change)}${placeText(change)}`;
    return [`${name}: ${[...listed, ...more].join(', ')}${greatest}`];
  }
  if (before === after && change !== null) return [`${name}: ${valueText(change)}`];
  const measured = change === null || change.at !== undefined ? '' : measureText(change);
  return [`${name}: ${before} → ${after}${measured}`];
}

function resultLine({ change, cause, ...block }: ResultChange): string {
  return `${nameOf(block)}: ${valueText(change)}${cause === 'formula' ? ', formula changed' : ''}`;
}

function valueText(change: ValueChange): string {
  return `${change.before} → ${change.after}${measureText(change)}${placeText(change)}`;
}

/** Where the ratio has a sense, the change in percent; of levels also as a difference. */
function measureText({ relative, difference }: ValueChange): string {
  const isOfLevel = difference !== undefined && !difference.endsWith('points');
  const percent = relative === null ? [] : [`${percentText(relative)}${isOfLevel ? ' of the absolute value' : ''}`];
  const parts = [...(difference === undefined ? [] : [difference]), ...percent];
  return parts.length === 0 ? '' : ` (${parts.join(', ')})`;
}

function placeText({ at }: ValueChange): string {
  return at === undefined ? '' : ` at ${at}`;
}

function textLine({ what, before, after, ...block }: TextChange): string {
  const subject = what === 'text' ? nameOf(block) : `${nameOf(block)}, ${what}`;
  if (what === 'form') return `${nameOf(block)}: digits, unit or form`;
  if (before === '') return `${subject}: added: ${after}`;
  return after === '' ? `${subject}: removed: ${before}` : `${subject}: ${before} → ${after}`;
}

function mentionLine(block: BlockMention): string {
  return `${block.block}  ${nameOf(block)}`;
}

/** Prose and tables without a title are known by where they stand. */
function nameOf({ block, path, name, label }: BlockMention): string {
  if (block === 'text' || (block === 'table' && label === 'Table')) return path;
  return name === undefined || name === label ? label : `${name}, ${label}`;
}
