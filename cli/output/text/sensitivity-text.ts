import type { CheckSensitivity, Effect, Sensitivity } from '../../../core/evaluate/sensitivity.ts';
import type { Paint } from '../../terminal.ts';
import { harmless } from '../harmless.ts';

/** What drives each check: its uncertain values by their effect, and the band in which its utilisation lies. */
export function sensitivityText(written: Sensitivity, paint: Paint): string {
  const { checks } = harmless(written);
  if (checks.length === 0) return 'No checks to rank.\n';
  if (checks.every(({ effects }) => effects.length === 0)) {
    return 'Nothing in this sheet is uncertain: give inputs a `tolerance` or a `range`.\n';
  }
  const parts = checks.map((check) => checkLines(check, paint).join('\n'));
  return `${[paint('bold', 'What drives the checks'), ...parts].join('\n\n')}\n`;
}

function checkLines(check: CheckSensitivity, paint: Paint): string[] {
  const { label, utilisation, effects, corners, firstOrder } = check;
  const moving = effects.filter(
    ({ change, low, high }) => change > 0 || low.utilisation === null || high.utilisation === null,
  );
  const width = Math.max(0, ...moving.map((effect) => effect.label.length));
  const values = Math.max(0, ...moving.map((effect) => range(effect).length));
  return [
    `   ${label}  ${number(utilisation)}`,
    ...moving.map(
      (effect) =>
        `      ${effect.label.padEnd(width)}  ${range(effect).padEnd(values)}  ${number(effect.low.utilisation)} to ${number(effect.high.utilisation)}${oddity(effect)}`,
    ),
    ...(moving.length === 0
      ? ['      nothing that is uncertain moves it']
      : [band(corners, firstOrder, utilisation, paint)]),
  ];
}

function range({ low, high }: Effect): string {
  return `${low.value} … ${high.value}`;
}

function oddity({ monotone, low, high }: Effect): string {
  if (low.utilisation === null || high.utilisation === null) return '  no value at one end';
  return monotone ? '' : '  to one side only';
}

function band(
  { least, greatest }: CheckSensitivity['corners'],
  { sum, independent }: CheckSensitivity['firstOrder'],
  utilisation: number | null,
  paint: Paint,
): string {
  const over = greatest !== null && greatest > 1 && utilisation !== null && utilisation <= 1;
  const corners = `${number(least)} to ${number(greatest)} at the corners`;
  const order = `± ${sum.toFixed(3)} added up, ± ${independent.toFixed(3)} as independent, to first order`;
  return `      ${over ? paint('red', `${corners}: over the limit at the worst`) : corners}; ${order}`;
}

function number(utilisation: number | null): string {
  return utilisation === null ? '–' : utilisation.toFixed(3);
}
