/**
 * Text that this browser keeps: the theme, drafts of remarks. A browser that refuses to store (private window, full disk)
 * costs the memory of it, never the page.
 */
export function readLocal(key: string): string | null {
  try {
    return localStorage.getItem(key);
  } catch {
    return null;
  }
}

export function writeLocal(key: string, value: string | null): void {
  try {
    if (value === null) localStorage.removeItem(key);
    else localStorage.setItem(key, value);
  } catch {
    // nothing can be kept, and nothing is lost that is on the screen
  }
}
