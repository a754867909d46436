import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router';
import { getLink, useLink as spendLink } from '@driprail/shared/contracts/session.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { sessionKey } from '../api/session.queries.ts';
import { HungForm } from '../components/hung-form.tsx';
import { fieldsOf } from '../../../lib/fields.ts';

/** An invitation or reset link: choose a password, and be signed in. */
export function LinkPage() {
  const { token = '' } = useParams();
  const client = useQueryClient();
  const navigate = useNavigate();
  const [password, setPassword] = useState('');
  const [again, setAgain] = useState('');
  const link = useQuery({
    queryKey: ['link', token],
    queryFn: ({ signal }) => call(getLink, { params: { token } }, signal),
    retry: false,
  });
  const use = useMutation({
    mutationFn: () => call(spendLink, { params: { token }, body: { password } }),
    onSuccess: (session) => {
      client.setQueryData(sessionKey, session);
      void navigate('/', { replace: true });
    },
  });
  const fields = fieldsOf(use.error);
  const isDifferent = again !== '' && again !== password;
  return (
    <HungForm
      title={link.data?.kind === 'invitation' ? 'Welcome' : 'New password'}
      {...(link.data && { company: link.data.companyName })}
      onSubmit={(event) => {
        event.preventDefault();
        if (!use.isPending && password === again) use.mutate();
      }}
    >
      <Loaded query={link} what="the link">
        {(data) => (
          <>
            <p className="mb-3">For {data.email}. At least ten letters; a sentence is easy to remember.</p>
            <TextField
              label="Password"
              type="password"
              autoComplete="new-password"
              value={password}
              error={fields['password']}
              onChange={(event) => setPassword(event.target.value)}
            />
            <TextField
              label="The same again"
              type="password"
              autoComplete="new-password"
              value={again}
              error={isDifferent ? 'The two are not the same yet.' : undefined}
              onChange={(event) => setAgain(event.target.value)}
            />
            {use.error && !fields['password'] ? (
              <p className="tape form-err" role="alert">
                {use.error.message}
              </p>
            ) : null}
            <Button
              type="submit"
              look="main"
              isBig
              isBusy={use.isPending}
              disabled={password === '' || password !== again}
            >
              Save and sign in
            </Button>
          </>
        )}
      </Loaded>
      <p className="mt-4">
        <Link to={paths.signIn}>To sign in</Link>
      </p>
    </HungForm>
  );
}
