import { useEffect, useRef, useState, type RefObject } from 'react';
import { Link } from 'react-router';
import type { Person } from '../../../schemas/api.ts';
import { paths } from '../../app/paths.ts';
import { notify } from '../../lib/notices.ts';
import { wordsOf } from '../../lib/problem.ts';
import { applyTheme, storedTheme, type Theme } from '../../lib/theme.ts';
import { initials } from '../../lib/words.ts';
import { useSignOut } from './api/sign-out.ts';

const THEMES: readonly { readonly theme: Theme; readonly word: string }[] = [
  { theme: 'system', word: 'As the system' },
  { theme: 'light', word: 'Light' },
  { theme: 'dark', word: 'Dark' },
];

const ITEM = 'block w-full cursor-pointer px-4 py-2 text-left hover:bg-wash';

/** Who is signed in, and what is theirs: tokens, the theme of this device, the way out. */
export function AccountMenu({ person }: { readonly person: Person | null }) {
  const signOut = useSignOut();
  const menu = useRef<HTMLDetailsElement>(null);
  useCloseOutside(menu);
  return (
    <details ref={menu} className="relative">
      <summary className="flex size-9 cursor-pointer list-none items-center justify-center rounded-full border border-rule bg-sheet text-xs font-semibold hover:border-pencil [&::-webkit-details-marker]:hidden">
        <span aria-hidden="true">{person === null ? '≡' : initials(person.name)}</span>
        <span className="sr-only">{person === null ? 'Menu' : `Account of ${person.name}`}</span>
      </summary>
      <div className="absolute right-0 z-40 mt-2 w-64 border border-rule bg-sheet py-2 shadow-lg">
        {person !== null && (
          <p className="border-b border-rule px-4 pb-2">
            <span className="font-semibold">{person.name}</span>
            <br />
            <span className="text-pencil">{person.email}</span>
          </p>
        )}
        <ThemeChoice />
        <Link to={paths.verify.href()} className={ITEM}>
          Verify a bundle
        </Link>
        {person === null ? (
          <Link to={paths.signIn.href()} className={ITEM}>
            Sign in
          </Link>
        ) : (
          <>
            <Link to={paths.tokens.href()} className={ITEM}>
              Personal tokens
            </Link>
            <button
              type="button"
              className={ITEM}
              onClick={() => signOut.mutate(undefined, { onError: (error) => notify('error', wordsOf(error)) })}
            >
              Sign out
            </button>
          </>
        )}
      </div>
    </details>
  );
}

function ThemeChoice() {
  const [theme, setTheme] = useState(storedTheme);
  return (
    <fieldset className="border-b border-rule px-4 py-2">
      <legend className="sr-only">Theme</legend>
      {THEMES.map((choice) => (
        <label key={choice.theme} className="flex min-h-7 cursor-pointer items-center gap-2">
          <input
            type="radio"
            name="theme"
            className="size-4 accent-copper"
            checked={theme === choice.theme}
            onChange={() => {
              applyTheme(choice.theme);
              setTheme(choice.theme);
            }}
          />
          {choice.word}
        </label>
      ))}
    </fieldset>
  );
}

/** Closes a menu when the pointer or the keyboard goes elsewhere, and on Escape. */
function useCloseOutside(menu: RefObject<HTMLDetailsElement | null>): void {
  useEffect(() => {
    const close = (event: Event) => {
      const isEscape = event instanceof KeyboardEvent && event.key === 'Escape';
      const isOutside = event.target instanceof Node && menu.current?.contains(event.target) === false;
      const isLeaving = isEscape || (isOutside && !(event instanceof KeyboardEvent));
      if (menu.current !== null && isLeaving) menu.current.open = false;
    };
    const events = ['pointerdown', 'focusin', 'keydown'];
    for (const event of events) document.addEventListener(event, close);
    return () => {
      for (const event of events) document.removeEventListener(event, close);
    };
  }, [menu]);
}
