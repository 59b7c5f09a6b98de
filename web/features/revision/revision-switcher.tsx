import { useQuery } from '@tanstack/react-query';
import { revisionOptions } from './api/get-revision.ts';
import type { RevisionRef } from './revision-ref.ts';

interface RevisionSwitcherProps {
  readonly reference: RevisionRef;
  readonly onSwitch: (revision: string) => void;
}

/** The revision in the line of the address: a choice where there are several. */
export function RevisionSwitcher({ reference, onSwitch }: RevisionSwitcherProps) {
  const { data } = useQuery(revisionOptions(reference));
  const revisions = data?.revisions ?? [reference.revision];
  if (revisions.length < 2) return <>revision {reference.revision}</>;
  return (
    <label className="inline-flex items-center gap-1">
      revision
      <select
        value={reference.revision}
        onChange={(event) => onSwitch(event.target.value)}
        className="cursor-pointer rounded-[2px] border border-rule bg-sheet px-1 py-0.5 font-semibold"
      >
        {revisions.map((revision) => (
          <option key={revision} value={revision}>
            {revision}
          </option>
        ))}
      </select>
    </label>
  );
}
