import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { changePassword, endOneSession, listSessions } from '@driprail/shared/contracts/session.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { useFormats } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import { WakingSwitch } from '../components/waking-switch.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

export function AccountPage() {
  const { user } = useSession();
  return (
    <>
      <PageHead title="Account" above={`${user.name}, ${user.email}`} />
      <RailPage>
        <div className="hung grid grid-cols-2 gap-10 p-5 max-w-[980px] max-[900px]:grid-cols-1">
          <PasswordForm />
          <div className="grid gap-6 content-start">
            {user.ridesToday || user.role === 'technician' ? <WakingSwitch /> : null}
            <Sessions />
          </div>
        </div>
      </RailPage>
    </>
  );
}

function PasswordForm() {
  const [current, setCurrent] = useState('');
  const [next, setNext] = useState('');
  const change = useMutation({
    mutationFn: () => call(changePassword, { body: { current, next } }),
    onSuccess: () => {
      setCurrent('');
      setNext('');
    },
  });
  const fields = fieldsOf(change.error);
  return (
    <form
      className="grid gap-3 content-start"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!change.isPending) change.mutate();
      }}
    >
      <h2 className="sec">Password</h2>
      <TextField
        label="Password you use now"
        type="password"
        autoComplete="current-password"
        value={current}
        error={fields['current']}
        onChange={(event) => setCurrent(event.target.value)}
      />
      <TextField
        label="New password"
        type="password"
        autoComplete="new-password"
        hint="At least ten letters. Other places where you are signed in are ended."
        value={next}
        error={fields['next']}
        onChange={(event) => setNext(event.target.value)}
      />
      <FormFault error={change.error} fields={fields} />
      {change.isSuccess ? <p role="status">The password is changed.</p> : null}
      <div>
        <Button type="submit" isBusy={change.isPending}>
          Change the password
        </Button>
      </div>
    </form>
  );
}

function Sessions() {
  const client = useQueryClient();
  const format = useFormats();
  const sessions = useQuery({ queryKey: ['sessions'], queryFn: ({ signal }) => call(listSessions, {}, signal) });
  const end = useMutation({
    mutationFn: (ref: string) => call(endOneSession, { params: { ref } }),
    onSettled: () => client.invalidateQueries({ queryKey: ['sessions'] }),
  });
  return (
    <section>
      <h2 className="sec">Signed in at</h2>
      <Loaded query={sessions} what="your sessions">
        {({ sessions: list }) => (
          <table className="grid-t">
            <tbody>
              {list.map((session) => (
                <tr key={session.ref}>
                  <td>
                    <b>{deviceWords(session.device)}</b>
                    {session.isCurrent ? ' (here)' : ''}
                    <br />
                    <span className="t-2">
                      since {formatDate(dayOf(session.signedInAt, format.zone))}, {format.clock(session.signedInAt)}
                    </span>
                  </td>
                  <td className="r">
                    {session.isCurrent ? null : (
                      <Button isBusy={end.isPending} onClick={() => end.mutate(session.ref)}>
                        End
                      </Button>
                    )}
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        )}
      </Loaded>
    </section>
  );
}

/** The kind of device is enough to know one's own again. */
function deviceWords(agent: string): string {
  const kinds: [RegExp, string][] = [
    [/android/i, 'Android phone'],
    [/iphone|ipad/i, 'Phone or tablet'],
    [/windows/i, 'Windows computer'],
    [/mac os/i, 'Mac'],
    [/linux/i, 'Linux computer'],
  ];
  return kinds.find(([pattern]) => pattern.test(agent))?.[1] ?? 'Another program';
}
