import { readComposition, type Amount, type GasFault } from './composition.ts';
import type { GasModel } from './gas-model.ts';

type Method = GasModel['method'];

const DEFAULT_METHOD: Method = 'gerg2008';
const METHODS: readonly Method[] = ['gerg2008', 'aga8_detail', 'peng_robinson', 'soave_redlich_kwong', 'ideal'];

export type { GasFault } from './composition.ts';

export interface BuiltGas {
  /** Present where no fault is an error. */
  readonly gas?: GasModel;
  readonly faults: readonly GasFault[];
}

/**
 * Makes a gas of what a sheet says about it: its name, its method (`gerg2008` where it names none) and its components.
 * All faults are found in one go.
 */
export function buildGas(name: string, method: string | undefined, amounts: readonly Amount[]): BuiltGas {
  const known = METHODS.find((candidate) => candidate === (method ?? DEFAULT_METHOD));
  const { moleFractions, faults } = readComposition(amounts);
  if (known === undefined) return { faults: [unknownMethod(method ?? ''), ...faults] };
  if (moleFractions === undefined) return { faults };
  return { gas: { name, method: known, moleFractions }, faults };
}

function unknownMethod(method: string): GasFault {
  const message = `there is no gas method \`${method}\``;
  return { code: 'GAS_METHOD', severity: 'error', message, hints: [], unknown: { name: method, known: METHODS } };
}
