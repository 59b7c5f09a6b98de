/** `1 hold`, `2 holds`; the plural is given where it is not the word with an s. */
export function count(number: number, noun: string, plural = `${noun}s`): string {
  return `${number} ${number === 1 ? noun : plural}`;
}

/** `M. Aldous` for the margin, where the whole name has no room. */
export function shortName(name: string): string {
  const words = name.trim().split(/\s+/);
  const last = words.at(-1) ?? '';
  return words.length < 2 ? last : `${(words[0] ?? '').charAt(0)}. ${last}`;
}

export function initials(name: string): string {
  const words = name.trim().split(/\s+/);
  const ends = words.length < 2 ? [words[0]] : [words[0], words.at(-1)];
  return ends.map((word) => word?.charAt(0).toUpperCase() ?? '').join('');
}

/** The first digits of a digest: enough to tell two apart at a glance. */
export function shortDigest(digest: string): string {
  return digest.replace(/^sha256-/, '').slice(0, 12);
}
