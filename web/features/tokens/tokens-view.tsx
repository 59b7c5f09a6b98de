import { useState, type FormEvent } from 'react';
import type { AccessToken } from '../../../schemas/api.ts';
import { notify } from '../../lib/notices.ts';
import { wordsOf } from '../../lib/problem.ts';
import { Button } from '../../ui/button.tsx';
import { Command } from '../../ui/command.tsx';
import { Dialog } from '../../ui/dialog.tsx';
import { Empty } from '../../ui/empty.tsx';
import { Field } from '../../ui/field.tsx';
import { Time } from '../../ui/time.tsx';
import { useCreateToken } from './api/create-token.ts';
import { useTokens } from './api/list-tokens.ts';
import { useRevokeToken } from './api/revoke-token.ts';

/** Personal tokens: for scripts and machines on which nobody can open a browser. */
export function TokensView() {
  const tokens = useTokens();
  const [revoking, setRevoking] = useState<AccessToken | null>(null);
  return (
    <>
      <NewTokenForm />
      {tokens.length === 0 ? (
        <Empty title="You have no tokens" commands={['npx antinode login']}>
          On your own machine you need none: sign in from the terminal, and approve it here.
        </Empty>
      ) : (
        <ul className="border-t border-ink">
          {tokens.map((token) => (
            <li
              key={token.id}
              className="flex flex-wrap items-center justify-between gap-x-6 gap-y-1 border-b border-rule py-3"
            >
              <span>
                <span className="font-semibold">{token.label}</span>
                <span className="block text-pencil">
                  created <Time iso={token.created} />,{' '}
                  {token.lastUsed === null ? (
                    'never used'
                  ) : (
                    <>
                      last used <Time iso={token.lastUsed} />
                    </>
                  )}
                </span>
              </span>
              <Button small variant="danger" onClick={() => setRevoking(token)} aria-label={`Revoke ${token.label}`}>
                Revoke
              </Button>
            </li>
          ))}
        </ul>
      )}
      {revoking !== null && <RevokeDialog token={revoking} onClose={() => setRevoking(null)} />}
    </>
  );
}

function NewTokenForm() {
  const [label, setLabel] = useState('');
  const create = useCreateToken();
  const submit = (event: FormEvent) => {
    event.preventDefault();
    create.mutate({ label }, { onSuccess: () => setLabel('') });
  };
  return (
    <div className="mb-8">
      <form onSubmit={submit} className="flex flex-wrap items-end gap-3">
        <Field
          label="What it is for"
          className="grow sm:max-w-sm"
          required
          maxLength={100}
          value={label}
          onChange={(event) => setLabel(event.target.value)}
          fault={create.isError ? wordsOf(create.error) : null}
        />
        <Button type="submit" variant="primary" disabled={create.isPending}>
          Create a token
        </Button>
      </form>
      {create.data !== undefined && (
        <div role="status" className="mt-4 border border-verdigris bg-sheet px-5 py-4">
          <p className="mb-2">
            <span className="font-semibold">Copy the token now.</span> It is shown once; the server keeps only its
            digest.
          </p>
          <Command text={create.data.token} />
        </div>
      )}
    </div>
  );
}

function RevokeDialog({ token, onClose }: { readonly token: AccessToken; readonly onClose: () => void }) {
  const revoke = useRevokeToken();
  const confirm = () => {
    revoke.mutate(token.id, {
      onSuccess: () => {
        notify('info', `The token “${token.label}” is revoked.`);
        onClose();
      },
    });
  };
  return (
    <Dialog title={`Revoke “${token.label}”?`} onClose={onClose}>
      <p>Whatever uses it is refused from now on. What was done with it stands.</p>
      {revoke.isError && (
        <p role="alert" className="mt-3 text-madder">
          {wordsOf(revoke.error)}
        </p>
      )}
      <div className="mt-5 flex justify-end gap-3">
        <Button onClick={onClose}>Keep it</Button>
        <Button variant="danger" disabled={revoke.isPending} onClick={confirm}>
          Revoke
        </Button>
      </div>
    </Dialog>
  );
}
