/** Name of a file as seen from another: both stand in one folder, or the file in a folder below it. Null where it would lead out. */
export function nameBeside(file: string, name: string): string | null {
  const parts = name.split('/');
  const leadsOut = name.includes('\\') || /^[A-Za-z]:/.test(name);
  if (leadsOut || parts.some((part) => part === '' || part === '.' || part === '..')) return null;
  const folder = file.includes('/') ? file.slice(0, file.lastIndexOf('/') + 1) : '';
  return folder + name;
}

/** Name of the file beside a sheet that pins the values it takes from other sheets. */
export const LOCK_FILE = 'antinode.lock.json';
