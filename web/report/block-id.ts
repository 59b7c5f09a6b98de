/** Element id of a block or section: its path with dashes, as `sections-2-steps-F_run`. Names hold no dash, so ids stay apart. */
export function blockId(path: string): string {
  return path.replaceAll('/', '-');
}
