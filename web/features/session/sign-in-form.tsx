import { useState, type FormEvent } from 'react';
import { hasCode, wordsOf } from '../../lib/problem.ts';
import { Button } from '../../ui/button.tsx';
import { Field } from '../../ui/field.tsx';
import { useSignIn } from './api/sign-in.ts';

export function SignInForm({ onSignedIn }: { readonly onSignedIn: () => void }) {
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const signIn = useSignIn();
  const submit = (event: FormEvent) => {
    event.preventDefault();
    signIn.mutate({ email, password }, { onSuccess: onSignedIn });
  };
  const isWrong = hasCode(signIn.error, 'wrong-password');
  return (
    <form onSubmit={submit} className="flex flex-col gap-4">
      <Field
        label="E-mail"
        type="email"
        name="email"
        autoComplete="username"
        required
        autoFocus
        value={email}
        onChange={(event) => setEmail(event.target.value)}
      />
      <Field
        label="Password"
        type="password"
        name="password"
        autoComplete="current-password"
        required
        value={password}
        onChange={(event) => setPassword(event.target.value)}
        fault={signIn.isError && isWrong ? wordsOf(signIn.error) : null}
      />
      {signIn.isError && !isWrong && (
        <p role="alert" className="text-madder">
          <span aria-hidden="true">▲</span> {wordsOf(signIn.error)}
        </p>
      )}
      <Button type="submit" variant="primary" disabled={signIn.isPending}>
        {signIn.isPending ? 'Signing in…' : 'Sign in'}
      </Button>
    </form>
  );
}
