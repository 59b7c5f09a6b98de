/** The path `step` places on from the current one. Without a current one a walk begins at the end it would come from. */
export function walk(paths: readonly string[], current: string | undefined, step: 1 | -1): string | undefined {
  const at = current === undefined ? -1 : paths.indexOf(current);
  if (at === -1) return step === 1 ? paths[0] : paths.at(-1);
  return paths[Math.min(paths.length - 1, Math.max(0, at + step))];
}
