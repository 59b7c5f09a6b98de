import { hasErrors } from '../diagnostics/diagnostic.ts';
import { locateDiagnostics } from '../diagnostics/locate.ts';
import type { LocatedDiagnostic } from '../diagnostics/located-diagnostic.ts';
import { Arena } from '../expression/arena.ts';
import type { GasModel } from '../gas/gas-model.ts';
import type { CheckNode } from '../sheet/document.ts';
import { compute, type Givens } from './compute.ts';
import { prepareSheet, type Prepared } from './prepare-sheet.ts';
import type { Uncertain, Variation } from './read-tolerances.ts';
import { requestTexts, type EvaluateRequest } from './request.ts';

/** What one uncertain value does to a check, when it alone moves to either side. */
export interface Effect {
  readonly path: string;
  readonly label: string;
  readonly low: { readonly value: string; readonly utilisation: number | null };
  readonly high: { readonly value: string; readonly utilisation: number | null };
  /** Largest change of the utilisation, to either side. */
  readonly change: number;
  /** The utilisation rises to one side and falls to the other. */
  readonly monotone: boolean;
}

export interface CheckSensitivity {
  /** Position of the check in reading order, from 0. */
  readonly check: number;
  readonly that: string;
  readonly label: string;
  readonly utilisation: number | null;
  /** By their effect, the largest first. */
  readonly effects: readonly Effect[];
  /**
   * Utilisation at the two corners: every value on the side that lowers it, and on the side that raises it. Exact where
   * all effects are monotone and stay so together.
   */
  readonly corners: { readonly least: number | null; readonly greatest: number | null };
  /** First-order: all changes added up, and added as independent ones are, by the root of the sum of their squares. */
  readonly firstOrder: { readonly sum: number; readonly independent: number };
}

export interface Sensitivity {
  readonly checks: readonly CheckSensitivity[];
  readonly diagnostics: readonly LocatedDiagnostic[];
}

/**
 * Ranks what is uncertain in a sheet by what it does to each check: every value moves to both sides alone, then all of
 * them together to the corners.
 *
 * @returns null where the sheet has an error
 */
export function evaluateSensitivity(request: EvaluateRequest): Sensitivity | null {
  const texts = requestTexts(request);
  const { prepared, diagnostics } = prepareSheet(request, texts);
  if (prepared === null) return null;
  const study = new Study(prepared);
  const stated = study.utilisations([]);
  if (stated === null) return null;
  const sides = prepared.uncertain.map((uncertain) => ({
    uncertain,
    low: study.utilisations([[uncertain, uncertain.low]]),
    high: study.utilisations([[uncertain, uncertain.high]]),
  }));
  const checks = [...prepared.typed.checks.keys()].map((node, check) => {
    const utilisation = stated.get(node) ?? null;
    const effects = sides.map(({ uncertain, low, high }) =>
      effectOf(uncertain, utilisation, low?.get(node) ?? null, high?.get(node) ?? null),
    );
    const changes = effects.map(({ change }) => change);
    return {
      check,
      that: node.that.text.trim(),
      label: node.label?.text ?? node.that.text.trim(),
      utilisation,
      effects: effects.toSorted((a, b) => b.change - a.change),
      corners: {
        least: study.corner(node, effects, 'least'),
        greatest: study.corner(node, effects, 'greatest'),
      },
      firstOrder: {
        sum: changes.reduce((sum, change) => sum + change, 0),
        independent: Math.sqrt(changes.reduce((sum, change) => sum + change * change, 0)),
      },
    };
  });
  return { checks, diagnostics: locateDiagnostics(diagnostics, (file) => texts.get(file)) };
}

function effectOf(
  { path, label, low, high }: Uncertain,
  stated: number | null,
  atLow: number | null,
  atHigh: number | null,
): Effect {
  const from = (side: number | null): number => (side === null || stated === null ? 0 : side - stated);
  return {
    path,
    label,
    low: { value: low.printed, utilisation: atLow },
    high: { value: high.printed, utilisation: atHigh },
    change: Math.max(Math.abs(from(atLow)), Math.abs(from(atHigh))),
    monotone: atLow !== null && atHigh !== null && from(atLow) * from(atHigh) <= 0,
  };
}

type Moves = readonly (readonly [Uncertain, Variation])[];

/** One sheet, computed again and again with some of its values moved. */
class Study {
  private readonly prepared: Prepared;
  private readonly arena = new Arena();
  private readonly known = new Map<string, ReadonlyMap<CheckNode, number | null> | null>();

  constructor(prepared: Prepared) {
    this.prepared = prepared;
  }

  /** Utilisation of every check; null where the moved values have no result. */
  utilisations(moves: Moves): ReadonlyMap<CheckNode, number | null> | null {
    const { typed, givens } = this.prepared;
    this.arena.clear();
    const { checks, diagnostics } = compute(typed, withMoves(givens, moves), this.arena);
    if (hasErrors(diagnostics)) return null;
    return new Map([...checks].map(([node, { utilisation }]) => [node, utilisation]));
  }

  /** Utilisation of a check with every value on the side that lowers it, or on the side that raises it. */
  corner(node: CheckNode, effects: readonly Effect[], which: 'least' | 'greatest'): number | null {
    const { uncertain } = this.prepared;
    const sides = effects.map(({ low, high }) => {
      const rises = (high.utilisation ?? Number.NEGATIVE_INFINITY) >= (low.utilisation ?? Number.NEGATIVE_INFINITY);
      return rises === (which === 'greatest') ? 'high' : 'low';
    });
    const key = sides.join();
    if (!this.known.has(key)) {
      const moves = uncertain.map((each, i): Moves[number] => [each, sides[i] === 'high' ? each.high : each.low]);
      this.known.set(key, this.utilisations(moves));
    }
    return this.known.get(key)?.get(node) ?? null;
  }
}

/** The givens with some of them moved. Shares of one gas that move together are moved at once. */
function withMoves(givens: Givens, moves: Moves): Givens {
  const inputs = new Map(givens.inputs);
  const shares = new Map<string, Map<string, number>>();
  for (const [{ name }, { instead }] of moves) {
    if ('input' in instead) inputs.set(name, instead.input);
    else shares.set(name, (shares.get(name) ?? new Map<string, number>()).set(instead.component, instead.share));
  }
  const moved = (model: GasModel): GasModel => withShares(model, shares.get(model.name));
  const gases = new Map(
    [...givens.gases].map(([name, { axes, models }]) => [
      name,
      { axes, models: shares.size === 0 ? models : models.map(moved) },
    ]),
  );
  return { ...givens, inputs, gases };
}

/** A gas of which some shares are given, and the others make room in proportion. */
function withShares(model: GasModel, shares: ReadonlyMap<string, number> | undefined): GasModel {
  if (shares === undefined) return model;
  const sum = (fractions: Iterable<number>): number => [...fractions].reduce((total, fraction) => total + fraction, 0);
  const before = sum([...shares.keys()].map((id) => model.moleFractions.get(id) ?? 0));
  const rest = before < 1 ? (1 - sum(shares.values())) / (1 - before) : 0;
  const moleFractions = new Map(
    [...model.moleFractions].map(([id, fraction]) => [id, shares.get(id) ?? fraction * rest]),
  );
  return { ...model, moleFractions };
}
