import { closeOrNull, ownQuantity } from './compare-reports.ts';
import type {
  AxisChange,
  CheckChange,
  CheckState,
  ComparedSheet,
  Comparison,
  FormulaChange,
  InputChange,
  ResultChange,
  TextChange,
} from './comparison.ts';
import { inputChange } from './input-changes.ts';
import { mention } from './mention.ts';
import type { Block, CheckBlock, Hold, Report } from './model.ts';
import { textChanges } from './own-text.ts';
import { pairBlocks } from './pair-blocks.ts';
import { usedBy } from './used-by.ts';
import { pointKey, valueChange } from './value-change.ts';

/**
 * Says what changed from one revision of a sheet to another, for a person who has to judge it: checks first. A block
 * with an equal digest is unchanged, with all that it rests on; whether a block with another digest changed by itself is
 * told by its own text.
 *
 * This compares two states that are meant to differ. Whether a record can be made again is asked of `compareReports`.
 */
export function compareRevisions(before: Report, after: Report): Comparison {
  const all = pairBlocks(before, after);
  const pairs = all.flatMap((pair) =>
    pair.before === null || pair.after === null ? [] : [[pair.before, pair.after] as const],
  );
  const added = all.flatMap((pair) => (pair.before === null && pair.after !== null ? [pair.after] : []));
  const removed = all.flatMap((pair) => (pair.after === null && pair.before !== null ? [pair.before] : []));
  const changes = pairs.map(([a, b]) => changeOf(a, b, before, after));
  const differing = pairs.filter(([a, b]) => a.digest !== b.digest).map(([, b]) => b);
  const own = withFormChanges(changes, differing, added, after);
  const checks = [...changes.flatMap(({ check }) => check), ...added.flatMap(newCheck)];
  const changed = new Set(own.filter(isOwn).map(({ block }) => block.path));
  return {
    antinode: 'comparison/1',
    before: comparedSheet(before),
    after: comparedSheet(after),
    newlyFailing: checks.filter(isNewlyFailing),
    checks: checks.filter((check) => !isNewlyFailing(check) && check.before !== null),
    holds: { opened: holdsOnlyIn(after, before), closed: holdsOnlyIn(before, after) },
    axes: axisChanges(before, after),
    inputs: own.flatMap(({ input }) => input),
    formulas: own.flatMap(({ formula }) => formula),
    results: own.flatMap(({ result }) => result),
    added: added.map(mention),
    removed: removed.map(mention),
    texts: own.flatMap(({ texts }) => texts).filter((change) => !isHoldTold(change)),
    affected: differing.filter(({ path }) => !changed.has(path)).map(mention),
    unchanged: pairs.length - differing.length,
  };
}

/** All that changed of one block; each list has one entry or none, except that of texts. */
interface BlockChange {
  readonly block: Block;
  readonly check: readonly CheckChange[];
  readonly input: readonly InputChange[];
  readonly formula: readonly FormulaChange[];
  readonly result: readonly ResultChange[];
  readonly texts: readonly TextChange[];
}

function changeOf(a: Block, b: Block, before: Report, after: Report): BlockChange {
  const input = inputChange(a, b, before, after);
  const formula = formulaChange(a, b);
  return {
    block: b,
    check: a.block === 'check' && b.block === 'check' ? checkChange(a, b) : [],
    input: input === null ? [] : [input],
    formula,
    result: resultChange(b, formula.length > 0, before, after),
    texts: a.digest === b.digest ? [] : textChanges(a, b),
  };
}

function formulaChange(a: Block, b: Block): FormulaChange[] {
  const [from, to] = [formulaText(a), formulaText(b)];
  return from === undefined || to === undefined || from === to ? [] : [{ ...mention(b), before: from, after: to }];
}

function formulaText(block: Block): string | undefined {
  if (block.block === 'check') return block.that;
  return block.block === 'step' ? block.calc : undefined;
}

function resultChange(block: Block, isOwnFormula: boolean, before: Report, after: Report): ResultChange[] {
  if (block.block !== 'step') return [];
  const [from, to] = [ownQuantity(before, block.name), ownQuantity(after, block.name)];
  const change = from === undefined || to === undefined ? null : valueChange(from, to);
  return change === null ? [] : [{ ...mention(block), change, cause: isOwnFormula ? 'formula' : 'affected' }];
}

function checkChange(a: CheckBlock, b: CheckBlock): CheckChange[] {
  const [from, to] = [checkState(a), checkState(b)];
  const isSame =
    from.that === to.that &&
    from.status === to.status &&
    from.at === to.at &&
    from.points?.failed === to.points?.failed &&
    from.points?.all === to.points?.all &&
    closeOrNull(from.utilisation, to.utilisation);
  return isSame ? [] : [{ ...mention(b), before: from, after: to }];
}

function newCheck(block: Block): CheckChange[] {
  return block.block === 'check' ? [{ ...mention(block), before: null, after: checkState(block) }] : [];
}

function checkState({ that, status, utilisation, standing, at, points }: CheckBlock): CheckState {
  return {
    that,
    status,
    utilisation,
    standing,
    ...(at === undefined ? {} : { at }),
    ...(points === undefined ? {} : { points }),
  };
}

function isNewlyFailing({ before, after }: CheckChange): boolean {
  return after.status === 'fail' && before?.status !== 'fail';
}

function isOwn({ input, formula, texts }: BlockChange): boolean {
  return (
    input.some(({ before, after, parts }) => before !== after || parts.length > 0) || formula.length + texts.length > 0
  );
}

/**
 * A report does not carry all of a block's own text: the digits that it is to be printed with, for one. Where the digest
 * differs, nothing that it reads does, and no change was seen, it is one of those.
 */
function withFormChanges(
  changes: readonly BlockChange[],
  differing: readonly Block[],
  added: readonly Block[],
  after: Report,
): BlockChange[] {
  const touched = new Set([...differing, ...added].map(({ path }) => path));
  return changes.map((change) => {
    const { block, texts } = change;
    const isUnseen = touched.has(block.path) && !isOwn(change) && !restsOn(block, touched, after);
    if (!isUnseen) return change;
    const form: TextChange = { ...mention(block), what: 'form', before: '', after: '' };
    return { ...change, texts: [...texts, form] };
  });
}

function restsOn(block: Block, paths: ReadonlySet<string>, report: Report): boolean {
  return usedBy(block, report).some((path) => paths.has(path));
}

/** A hold that is opened or closed stands among the holds. */
function isHoldTold({ what, before, after }: TextChange): boolean {
  return what === 'hold' && (before === '' || after === '');
}

/** A hold is the same as long as it is on the same name; its reason may be put in other words. */
function holdsOnlyIn(report: Report, other: Report): Hold[] {
  const names = new Set(other.holds.map(({ name }) => name));
  return report.holds.filter(({ name }) => !names.has(name));
}

function axisChanges(before: Report, after: Report): AxisChange[] {
  const names = [...new Set([...before.axes, ...after.axes].map(({ name }) => name))];
  return names.flatMap((name) => {
    const [from, to] = [before, after].map(({ axes }) => axes.find((axis) => axis.name === name));
    const unit = to?.unit ?? from?.unit;
    const sameUnit = from?.unit === to?.unit;
    const added = pointsOnlyIn(to?.values, sameUnit ? from?.values : []);
    const removed = pointsOnlyIn(from?.values, sameUnit ? to?.values : []);
    if (added.length + removed.length === 0) return [];
    return [{ name, ...(unit === undefined ? {} : { unit }), added, removed }];
  });
}

function pointsOnlyIn(
  values: readonly (string | number)[] = [],
  others: readonly (string | number)[] = [],
): (string | number)[] {
  const known = new Set(others.map(pointKey));
  return values.filter((point) => !known.has(pointKey(point)));
}

function comparedSheet({ sheet: { number, title, digest } }: Report): ComparedSheet {
  return { number, title, digest };
}
