import { COMPONENTS, type Component } from './data/components.ts';

const BY_NAME = new Map(
  COMPONENTS.flatMap((component) =>
    [component.id, component.name, ...component.synonyms].map((name) => [key(name), component] as const),
  ),
);

const BY_ID = new Map(COMPONENTS.map((component) => [component.id, component]));

/** Ids of all components, in the order of the table. */
export const COMPONENT_IDS: readonly string[] = COMPONENTS.map(({ id }) => id);

/** The component of an id, a name or a synonym: `n_butane`, `n-Butane`, `nC4`. */
export function findComponent(text: string): Component | undefined {
  return BY_NAME.get(key(text));
}

/** The component of an id in a gas model. Such ids come from `findComponent`, so a missing one is a bug. */
export function componentById(id: string): Component {
  const component = BY_ID.get(id);
  if (component === undefined) throw new Error(`no component has the id ${id}`);
  return component;
}

function key(text: string): string {
  return text.toLowerCase().replace(/[\s_-]/g, '');
}
