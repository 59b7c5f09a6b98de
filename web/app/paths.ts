/** Every URL of the viewer: the pattern that the router matches, and the way to write it. */
export const paths = {
  desk: { pattern: '/', href: () => '/' },
  signIn: {
    pattern: '/sign-in',
    /** `next`: where to go after signing in. */
    href: (next?: string) =>
      next === undefined || next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`,
  },
  study: { pattern: '/studies/:study', href: (study: string) => `/studies/${encodeURIComponent(study)}` },
  sheet: {
    pattern: '/studies/:study/sheets/:number',
    href: (study: string, number: string) => `${paths.study.href(study)}/sheets/${encodeURIComponent(number)}`,
  },
  revision: {
    pattern: '/studies/:study/sheets/:number/:revision',
    href: (study: string, number: string, revision: string) =>
      `${paths.sheet.href(study, number)}/${encodeURIComponent(revision)}`,
  },
  verify: { pattern: '/verify', href: () => '/verify' },
  device: { pattern: '/device', href: () => '/device' },
  tokens: { pattern: '/account/tokens', href: () => '/account/tokens' },
} as const;

/** Where to go after signing in: only a path of this site, never an address that a link has smuggled in. */
export function safeNext(next: string | null): string {
  return next !== null && /^\/(?![/\\])/.test(next) ? next : paths.desk.href();
}
