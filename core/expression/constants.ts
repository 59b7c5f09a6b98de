/** A number that every formula knows by name. */
export interface Constant {
  readonly name: string;
  readonly value: number;
  readonly tex: string;
  readonly summary: string;
}

const LIST: readonly Constant[] = [
  { name: 'pi', value: Math.PI, tex: '\\pi', summary: 'ratio of a circle’s circumference to its diameter' },
  { name: 'e', value: Math.E, tex: '\\mathrm{e}', summary: 'base of the natural logarithm' },
];

export const CONSTANTS: ReadonlyMap<string, Constant> = new Map(LIST.map((constant) => [constant.name, constant]));
