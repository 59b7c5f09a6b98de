import type { ReactNode } from 'react';
import { Command } from './command.tsx';

interface EmptyProps {
  readonly title: string;
  readonly children: ReactNode;
  readonly commands?: readonly string[];
}

/** An empty place: says that it is, and what to do next. */
export function Empty({ title, children, commands = [] }: EmptyProps) {
  return (
    <div className="border border-rule bg-sheet px-6 py-6">
      <p className="font-serif text-lg font-semibold">{title}</p>
      <div className="mt-1 max-w-xl text-pencil">{children}</div>
      {commands.length > 0 && (
        <div className="mt-4 flex max-w-md flex-col gap-2">
          {commands.map((command) => (
            <Command key={command} text={command} />
          ))}
        </div>
      )}
    </div>
  );
}
