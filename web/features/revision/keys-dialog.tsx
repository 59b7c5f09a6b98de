import { Dialog } from '../../ui/dialog.tsx';
import { KEYS } from './use-keyboard.ts';

export function KeysDialog({ onClose }: { readonly onClose: () => void }) {
  return (
    <Dialog title="Keys" onClose={onClose}>
      <dl className="grid grid-cols-[5rem_1fr] gap-y-2">
        {KEYS.map(({ key, words }) => (
          <div key={key} className="contents">
            <dt>
              <Key name={key} />
            </dt>
            <dd>{words}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}

export function Key({ name }: { readonly name: string }) {
  return (
    <kbd className="inline-block min-w-6 border border-rule bg-sheet px-1.5 text-center font-mono text-[0.8125rem]">
      {name}
    </kbd>
  );
}
