import { useState, type DragEvent } from 'react';
import type { Report } from '../../../core/report/model.ts';
import { ReportView } from '../../report/report-view.tsx';
import { wordsOf } from '../../lib/problem.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { ProofList } from './proof-list.tsx';
import { useVerify } from './use-verify.ts';

/** Verifies a bundle in this browser. Nothing of it is sent anywhere. */
export function VerifyView() {
  const [serverKey, setServerKey] = useState('');
  const verify = useVerify();
  const start = (file: File | undefined) => {
    if (file !== undefined) verify.mutate({ file, serverKey: serverKey.trim() });
  };
  return (
    <>
      <DropPlace onFile={start} />
      <details className="mt-4">
        <summary className="cursor-pointer text-pencil hover:text-ink">Name the server key that you trust</summary>
        <Field
          className="mt-3 max-w-xl"
          label="Id of the server key"
          hint="The team that issues revisions tells it to you by another way. Without it, the key is taken as the bundle carries it, and the proof says so."
          spellCheck={false}
          autoComplete="off"
          value={serverKey}
          onChange={(event) => setServerKey(event.target.value)}
        />
      </details>
      <div className="mt-8">
        {verify.isPending && (
          <p role="status" className="flex flex-wrap items-center gap-4">
            Verifying {verify.variables.file.name}: signatures, digests, log, and a full evaluation…
            <Button small onClick={verify.reset}>
              Stop
            </Button>
          </p>
        )}
        {verify.isError && (
          <p role="alert" className="text-madder">
            ▲ {wordsOf(verify.error)}
          </p>
        )}
        {verify.isSuccess && (
          <>
            <p className="mb-2 font-mono text-[0.8125rem] text-pencil">{verify.variables.file.name}</p>
            <ProofList verification={verify.data.verification} />
            {verify.data.report !== null && <CarriedReport report={verify.data.report} />}
          </>
        )}
      </div>
    </>
  );
}

function DropPlace({ onFile }: { readonly onFile: (file: File | undefined) => void }) {
  const [isOver, setOver] = useState(false);
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    onFile(event.dataTransfer.files[0]);
  };
  return (
    <label
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={drop}
      className={`flex cursor-pointer flex-col items-center border-2 border-dashed bg-sheet px-6 py-12 text-center focus-within:outline-2 focus-within:outline-offset-2 focus-within:outline-copper ${isOver ? 'border-copper' : 'border-rule hover:border-pencil'}`}
    >
      <span className="font-serif text-lg font-semibold">Drop a bundle here, or choose one</span>
      <span className="mt-1 text-pencil">It is read and evaluated in this browser; nothing leaves it.</span>
      <input
        type="file"
        accept=".json,application/json"
        className="sr-only"
        onChange={(event) => {
          onFile(event.target.files?.[0]);
          // Choosing the same file again, after it was changed, must ask again.
          event.target.value = '';
        }}
      />
    </label>
  );
}

function CarriedReport({ report }: { readonly report: Report }) {
  const [isShown, setShown] = useState(false);
  if (!isShown) {
    return (
      <Button className="mt-8" onClick={() => setShown(true)}>
        Read the report that it carries
      </Button>
    );
  }
  return (
    <div className="mt-8 max-w-[47rem]">
      <ReportView report={report} />
    </div>
  );
}
