import { useEffect } from 'react';
import { Panel } from '../../ui/panel.tsx';
import { Bone } from '../../ui/skeleton.tsx';
import { useFile } from './api/get-file.ts';
import type { RevisionRef } from './revision-ref.ts';

interface FilesPanelProps {
  readonly reference: RevisionRef;
  readonly files: readonly string[];
  readonly file: string | null;
  readonly onFile: (file: string) => void;
}

/** The source files of a revision, as they were pushed. */
export function FilesPanel({ reference, files, file, onFile }: FilesPanelProps) {
  const shown = files.find((name) => name === file) ?? files[0];
  if (shown === undefined) return <p className="text-pencil">This revision carries no files.</p>;
  return (
    <div className="min-w-0 wide:col-span-2">
      {files.length > 1 && (
        <div className="mb-3 flex flex-wrap gap-x-5 gap-y-1" role="group" aria-label="Files">
          {files.map((name) => (
            <button
              key={name}
              type="button"
              aria-pressed={name === shown}
              onClick={() => onFile(name)}
              className={`cursor-pointer font-mono text-[0.8125rem] ${name === shown ? 'text-copper' : 'text-pencil hover:text-ink'}`}
            >
              {name}
            </button>
          ))}
        </div>
      )}
      <Panel key={shown} fallback={<Bone className="h-96 w-full" />}>
        <Source reference={reference} name={shown} />
      </Panel>
    </div>
  );
}

function Source({ reference, name }: { readonly reference: RevisionRef; readonly name: string }) {
  const text = useFile(reference, name);
  useEffect(() => {
    // The lines did not exist yet when the browser looked for the one that the address names.
    const line = /^#(L\d+)$/.exec(window.location.hash)?.[1];
    if (line !== undefined) document.getElementById(line)?.scrollIntoView({ block: 'center' });
  }, [text]);
  return (
    <figure className="border border-rule bg-sheet">
      <figcaption className="border-b border-rule px-4 py-2 font-mono text-[0.8125rem]">{name}</figcaption>
      <pre
        className="overflow-x-auto py-3 font-mono text-[0.8125rem] leading-6"
        tabIndex={0}
        aria-label={`Text of ${name}`}
      >
        <code className="source-lines">
          {text
            .replace(/\n$/, '')
            .split('\n')
            .map((line, index) => (
              <span key={index} id={`L${index + 1}`} className="source-line">
                {line}
                {'\n'}
              </span>
            ))}
        </code>
      </pre>
    </figure>
  );
}
