/** A gas of given composition and method. Physics functions take it by reference; sheets name it. */
export interface GasModel {
  readonly name: string;
  readonly method: 'gerg2008' | 'aga8_detail' | 'peng_robinson' | 'soave_redlich_kwong' | 'ideal';
  /** Mole fractions by component id, adding up to 1. */
  readonly moleFractions: ReadonlyMap<string, number>;
}
