import type { ButtonHTMLAttributes, ReactNode } from 'react';

/** `muted`: the main action where it is not open yet; pressing it tells why. */
type Variant = 'primary' | 'muted' | 'plain' | 'quiet' | 'danger';

const VARIANTS: Readonly<Record<Variant, string>> = {
  primary: 'border-copper bg-copper text-on-copper hover:brightness-110',
  muted: 'border-copper bg-sheet text-copper hover:bg-wash',
  plain: 'border-rule bg-sheet text-ink hover:border-pencil',
  quiet: 'border-transparent bg-transparent text-pencil hover:text-ink',
  danger: 'border-madder bg-sheet text-madder hover:bg-wash',
};

interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  readonly variant?: Variant;
  readonly small?: boolean;
  readonly children: ReactNode;
}

/** A button. It never submits a form unless its type says so. */
export function Button({ variant = 'plain', small = false, className = '', type = 'button', ...rest }: ButtonProps) {
  const size = small ? 'min-h-7 px-2 text-[0.8125rem]' : 'min-h-9 px-3.5';
  return (
    <button
      type={type}
      className={`inline-flex cursor-pointer items-center justify-center gap-1.5 rounded-[3px] border font-semibold whitespace-nowrap transition-colors disabled:cursor-default disabled:opacity-60 ${size} ${VARIANTS[variant]} ${className}`}
      {...rest}
    />
  );
}
