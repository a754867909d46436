import { useEffect, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useLocation, useNavigate } from 'react-router';
import { getSetUp } from '@driprail/shared/contracts/settings.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { call } from '../../../lib/call.ts';
import { sessionQuery, useSignIn } from '../api/session.queries.ts';
import { HungForm } from '../components/hung-form.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

export function SignInPage() {
  const session = useQuery(sessionQuery);
  const setUp = useQuery({ queryKey: ['set-up'], queryFn: ({ signal }) => call(getSetUp, {}, signal) });
  const signIn = useSignIn();
  const navigate = useNavigate();
  const location = useLocation();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const from = (location.state as { from?: string } | null)?.from ?? '/';
  useEffect(() => {
    if (session.data) void navigate(from, { replace: true });
  }, [session.data, from, navigate]);
  if (setUp.data?.isNeeded) return <Navigate to={paths.setUp} replace />;
  const fields = fieldsOf(signIn.error);
  return (
    <HungForm
      title="Sign in"
      onSubmit={(event) => {
        event.preventDefault();
        if (!signIn.isPending) signIn.mutate({ email, password });
      }}
    >
      <TextField
        label="Work e-mail"
        type="email"
        autoComplete="username"
        autoFocus
        value={email}
        error={fields['email']}
        onChange={(event) => setEmail(event.target.value)}
      />
      <TextField
        label="Password"
        aside={<Link to={paths.forgotten}>Forgotten</Link>}
        type="password"
        autoComplete="current-password"
        value={password}
        error={fields['password']}
        onChange={(event) => setPassword(event.target.value)}
      />
      <FormFault error={signIn.error} fields={fields} className="form-err" />
      <Button type="submit" look="main" isBig isBusy={signIn.isPending}>
        Sign in
      </Button>
    </HungForm>
  );
}
