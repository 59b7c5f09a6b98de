import type { ReactNode } from 'react';

export function PageTitle({ children, below }: { readonly children: ReactNode; readonly below?: ReactNode }) {
  return (
    <div className="mb-7">
      <h1 className="font-serif text-[1.625rem] leading-tight font-semibold text-balance">{children}</h1>
      {below !== undefined && <p className="mt-1 text-pencil">{below}</p>}
    </div>
  );
}

export function SectionTitle({ children }: { readonly children: ReactNode }) {
  return <h2 className="mb-3 font-serif text-lg font-semibold">{children}</h2>;
}
