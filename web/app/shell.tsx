import type { ReactNode } from 'react';
import { Link } from 'react-router';
import { useQuery } from '@tanstack/react-query';
import { AccountMenu } from '../features/session/account-menu.tsx';
import { sessionOptions } from '../features/session/api/get-session.ts';
import { Logo } from './logo.tsx';
import { paths } from './paths.ts';

export interface Crumb {
  readonly label: ReactNode;
  readonly href?: string;
}

interface ShellProps {
  /** Title of the browser's tab. */
  readonly title: string;
  readonly crumbs?: readonly Crumb[];
  /** `column`: a page of text; `full`: the page lays itself out. */
  readonly width?: 'column' | 'narrow' | 'full';
  readonly children: ReactNode;
}

const WIDTHS = {
  column: 'mx-auto w-full max-w-[74rem] px-4 pt-8 pb-20 sm:px-7',
  narrow: 'mx-auto w-full max-w-[34rem] px-4 pt-12 pb-20',
  full: '',
} as const;

/** What every page has: the way past it for the keyboard, the line of where one is, the account. */
export function Shell({ title, crumbs = [], width = 'column', children }: ShellProps) {
  const person = useQuery(sessionOptions()).data?.person ?? null;
  return (
    <>
      <title>{`${title} · Antinode`}</title>
      <a href="#main" className="sr-only z-50 bg-sheet px-4 py-2 focus:not-sr-only focus:absolute">
        Skip to the content
      </a>
      <header className="flex items-center gap-5 border-b border-rule px-4 py-1.5 sm:px-7 print:hidden">
        <Link to={paths.desk.href()} className="flex items-center gap-2.5 text-[1.0625rem] font-bold tracking-tight">
          <Logo /> Antinode
        </Link>
        <Crumbs crumbs={crumbs} />
        <AccountMenu person={person} />
      </header>
      <main id="main" className={WIDTHS[width]}>
        {children}
      </main>
    </>
  );
}

function Crumbs({ crumbs }: { readonly crumbs: readonly Crumb[] }) {
  return (
    <nav aria-label="Where you are" className="min-w-0 grow">
      <ol className="flex flex-wrap items-center gap-x-2">
        {crumbs.map(({ label, href }, index) => (
          <li key={index} className={crumbClass(crumbs.length - 1 - index)}>
            {href === undefined ? (
              <span aria-current={index === crumbs.length - 1 ? 'page' : undefined}>{label}</span>
            ) : (
              <Link to={href} className="hover:text-copper">
                {label}
              </Link>
            )}
            {index < crumbs.length - 1 && <span aria-hidden="true">/</span>}
          </li>
        ))}
      </ol>
    </nav>
  );
}

/** A narrow screen keeps the last two. */
function crumbClass(fromEnd: number): string {
  if (fromEnd === 0) return 'font-semibold';
  return `gap-2 text-pencil ${fromEnd === 1 ? 'flex' : 'hidden sm:flex'}`;
}
