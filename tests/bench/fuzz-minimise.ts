/** Takes away from a text what it can do without while `stillFails` holds: lines first, then single characters. */
export function minimise(text: string, stillFails: (text: string) => boolean, budgetMs: number): string {
  const end = performance.now() + budgetMs;
  const tried = (candidate: string): boolean => performance.now() < end && stillFails(candidate);
  let shortest = text;
  for (;;) {
    const before = shortest.length;
    shortest = withoutParts(shortest.split(/(?<=\n)/), tried).join('');
    if (shortest.length < 4000) shortest = withoutParts(Array.from(shortest), tried).join('');
    if (shortest.length === before || performance.now() >= end) return shortest;
  }
}

/** Leaves out runs of parts, long runs first. */
function withoutParts(parts: string[], stillFails: (text: string) => boolean): string[] {
  let kept = parts;
  for (let run = Math.ceil(parts.length / 2); run >= 1; run = run === 1 ? 0 : Math.ceil(run / 2)) {
    for (let at = 0; at < kept.length;) {
      const candidate = kept.toSpliced(at, run);
      if (stillFails(candidate.join(''))) kept = candidate;
      else at += run;
    }
  }
  return kept;
}
