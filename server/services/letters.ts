const LETTERS = 26;

/** Letter of the n-th revision, from 1: A … Z, AA, AB … */
export function revisionLetter(ordinal: number): string {
  let rest = ordinal;
  let letter = '';
  while (rest > 0) {
    rest -= 1;
    letter = String.fromCharCode(65 + (rest % LETTERS)) + letter;
    rest = Math.floor(rest / LETTERS);
  }
  return letter;
}
