import { useState, type FormEvent } from 'react';
import type { DeviceInquiry } from '../../../schemas/api.ts';
import { wordsOf } from '../../lib/problem.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { Time } from '../../ui/time.tsx';
import { useDecideDevice } from './api/decide-device.ts';
import { useInquiry } from './api/get-inquiry.ts';
import { normaliseUserCode } from './user-code.ts';

interface DeviceViewProps {
  /** Code of the address; empty before one is entered. */
  readonly code: string;
  readonly onCode: (code: string) => void;
  readonly signedInAs: string;
}

/** Approves the sign-in of a command line that shows a code. */
export function DeviceView({ code, onCode, signedInAs }: DeviceViewProps) {
  const inquiry = useInquiry(code);
  if (code === '' || inquiry.isError) {
    return <CodeForm key={code} code={code} onCode={onCode} fault={inquiry.isError ? wordsOf(inquiry.error) : null} />;
  }
  if (inquiry.isPending) return <p role="status">Looking up {code}…</p>;
  return <Inquiry code={code} inquiry={inquiry.data} signedInAs={signedInAs} />;
}

interface CodeFormProps {
  readonly code: string;
  readonly onCode: (code: string) => void;
  readonly fault: string | null;
}

function CodeForm({ code, onCode, fault }: CodeFormProps) {
  const [typed, setTyped] = useState(code);
  const submit = (event: FormEvent) => {
    event.preventDefault();
    onCode(normaliseUserCode(typed));
  };
  return (
    <form onSubmit={submit} className="flex flex-col gap-4">
      <Field
        label="Code that the terminal shows"
        hint="The terminal shows it after npx antinode login."
        autoComplete="off"
        autoCapitalize="characters"
        spellCheck={false}
        autoFocus
        required
        value={typed}
        onChange={(event) => setTyped(event.target.value)}
        fault={fault}
      />
      <Button type="submit" variant="primary">
        Continue
      </Button>
    </form>
  );
}

const DECIDED: Readonly<Record<Exclude<DeviceInquiry['state'], 'waiting'>, string>> = {
  approved: '✓ Approved. The terminal goes on by itself; you can close this page.',
  refused: '✕ Refused. The terminal is not signed in.',
  expired: 'The code has expired. Run npx antinode login again.',
};

interface InquiryProps {
  readonly code: string;
  readonly inquiry: DeviceInquiry;
  readonly signedInAs: string;
}

function Inquiry({ code, inquiry, signedInAs }: InquiryProps) {
  const decide = useDecideDevice(code);
  if (inquiry.state !== 'waiting') return <p role="status">{DECIDED[inquiry.state]}</p>;
  return (
    <>
      <p className="mb-3 font-mono text-2xl tracking-wider">{code}</p>
      <p>
        <span className="font-semibold">{inquiry.client}</span> asks to act as{' '}
        <span className="font-semibold">{signedInAs}</span>: to push sheets, and to read what you may read. Each
        signature still asks for your password.
      </p>
      <p className="mt-1 text-pencil">
        Asked <Time iso={inquiry.requested} precise />. Approve only if your own terminal shows this very code.
      </p>
      {decide.isError && (
        <p role="alert" className="mt-3 text-madder">
          {wordsOf(decide.error)}
        </p>
      )}
      <div className="mt-5 flex gap-3">
        <Button variant="primary" disabled={decide.isPending} onClick={() => decide.mutate(true)}>
          Approve
        </Button>
        <Button disabled={decide.isPending} onClick={() => decide.mutate(false)}>
          Refuse
        </Button>
      </div>
    </>
  );
}
