import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Navigate, useNavigate } from 'react-router';
import { completeSetUp, getSetUp } from '@driprail/shared/contracts/settings.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { Logo } from '../../../components/logo.tsx';
import { call } from '../../../lib/call.ts';
import { useDraft } from '../../../lib/use-draft.ts';
import { changeSession } from '../../access/index.ts';
import { zoneNames } from '../zones.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

/** The first start: the company and its owner, with the one-time code from the terminal. */
export function SetUpPage() {
  const client = useQueryClient();
  const navigate = useNavigate();
  const setUp = useQuery({ queryKey: ['set-up'], queryFn: ({ signal }) => call(getSetUp, {}, signal) });
  const draft = useDraft('set-up-draft', () => ({
    companyName: '',
    zone: Intl.DateTimeFormat().resolvedOptions().timeZone,
    ownerName: '',
    email: '',
    code: '',
  }));
  const [password, setPassword] = useState('');
  const { value, set } = draft;
  const complete = useMutation({
    mutationFn: () => call(completeSetUp, { body: { ...value, password } }),
    onSuccess: (session) => {
      draft.drop();
      changeSession(client, session);
      void navigate(paths.vans, { replace: true });
    },
  });
  if (setUp.data && !setUp.data.isNeeded && !complete.isSuccess) return <Navigate to="/" replace />;
  const fields = fieldsOf(complete.error);
  const text = (name: keyof typeof value) => ({
    value: value[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) => set({ ...value, [name]: event.target.value }),
  });
  return (
    <div className="door set-up">
      <Logo className="logo" />
      <div className="rail" />
      <main className="set-up-in" id="main">
        <h1 className="t-hang">Set up</h1>
        <p className="mb-5">The company and its owner first; vans, people and the service menu follow.</p>
        <form
          noValidate
          onSubmit={(event) => {
            event.preventDefault();
            if (!complete.isPending) complete.mutate();
          }}
        >
          <section>
            <h2 className="t-hang">Company</h2>
            <div className="grid grid-cols-2 gap-x-5 max-[700px]:grid-cols-1">
              <TextField label="Company name" autoFocus {...text('companyName')} />
              <SelectField
                label="Time zone"
                value={value.zone}
                error={fields['zone']}
                hint="Days, shifts and the workweek go by it."
                onChange={(event) => set({ ...value, zone: event.target.value })}
              >
                {zoneNames(value.zone).map((zone) => (
                  <option key={zone} value={zone}>
                    {zone.replaceAll('_', ' ')}
                  </option>
                ))}
              </SelectField>
            </div>
          </section>
          <section>
            <h2 className="t-hang">Owner</h2>
            <div className="grid grid-cols-2 gap-x-5 max-[700px]:grid-cols-1">
              <TextField label="Your name" autoComplete="name" {...text('ownerName')} />
              <TextField label="Your e-mail" type="email" autoComplete="username" {...text('email')} />
              <TextField
                label="Password"
                type="password"
                autoComplete="new-password"
                hint="At least ten letters."
                value={password}
                error={fields['password']}
                onChange={(event) => setPassword(event.target.value)}
              />
              <TextField
                label="One-time code"
                hint="The terminal that started Driprail shows it."
                autoComplete="one-time-code"
                {...text('code')}
              />
            </div>
          </section>
          <FormFault error={complete.error} fields={fields} className="mb-4" />
          <div className="max-w-[340px]">
            <Button type="submit" look="main" isBig isBusy={complete.isPending}>
              Set up the company
            </Button>
          </div>
        </form>
      </main>
    </div>
  );
}
