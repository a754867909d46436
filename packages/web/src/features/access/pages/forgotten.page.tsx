import { useState } from 'react';
import { useMutation } from '@tanstack/react-query';
import { Link } from 'react-router';
import { requestReset } from '@driprail/shared/contracts/session.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { call } from '../../../lib/call.ts';
import { HungForm } from '../components/hung-form.tsx';
import { fieldsOf } from '../../../lib/fields.ts';

export function ForgottenPage() {
  const [email, setEmail] = useState('');
  const ask = useMutation({ mutationFn: () => call(requestReset, { body: { email } }) });
  const fields = fieldsOf(ask.error);
  return (
    <HungForm
      title="New password"
      onSubmit={(event) => {
        event.preventDefault();
        if (!ask.isPending) ask.mutate();
      }}
    >
      {ask.isSuccess ? (
        <p role="status">If that address has a login, a link is on its way. It works once, within two hours.</p>
      ) : (
        <>
          <TextField
            label="Work e-mail"
            type="email"
            autoComplete="username"
            autoFocus
            value={email}
            error={fields['email']}
            onChange={(event) => setEmail(event.target.value)}
          />
          {ask.error && !fields['email'] ? (
            <p className="tape form-err" role="alert">
              {ask.error.message}
            </p>
          ) : null}
          <Button type="submit" look="main" isBig isBusy={ask.isPending}>
            Send the link
          </Button>
        </>
      )}
      <p className="mt-4">
        <Link to={paths.signIn}>Back to sign in</Link>
      </p>
    </HungForm>
  );
}
