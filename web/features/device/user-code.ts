/** A user code as it is shown: capital letters and digits, a dash in the middle. Typed blanks and dashes do not matter. */
export function normaliseUserCode(typed: string): string {
  const bare = typed.toUpperCase().replace(/[^A-Z0-9]/g, '');
  return bare.length <= 4 ? bare : `${bare.slice(0, 4)}-${bare.slice(4, 8)}`;
}
