import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import type { Role } from '@driprail/shared/authz/actor';
import { listPeople } from '@driprail/shared/contracts/people.contract';
import {
  endLoginSessions,
  inviteLogin,
  listLogins,
  sendReset,
  updateLogin,
} from '@driprail/shared/contracts/session.contract';
import type { LoginDto } from '@driprail/shared/contracts/session.contract';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { useSession } from '../../../lib/session.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

const roles: Role[] = ['owner', 'dispatcher', 'technician'];

/** Who may sign in, as what. Only an owner is here: whoever could change a login could read its pay. */
export function LoginsPage() {
  const [isInviting, setInviting] = useState(false);
  const logins = useQuery({ queryKey: ['logins'], queryFn: ({ signal }) => call(listLogins, {}, signal) });
  return (
    <>
      <PageHead
        title="Logins"
        above="Who may sign in"
        sums={[{ label: 'In all', value: logins.data?.logins.length ?? '–' }]}
        actions={
          <Button look="main" onClick={() => setInviting(true)}>
            <Icon name="plus" /> Invite a person
          </Button>
        }
      />
      <RailPage>
        <div className="hung p-5 max-w-[1100px]">
          <div className="scroll-x">
            <Loaded query={logins} what="the logins">
              {({ logins: list }) => (
                <table className="grid-t stacks">
                  <thead>
                    <tr>
                      <th>Name</th>
                      <th>E-mail</th>
                      <th>Role</th>
                      <th>State</th>
                      <th className="r">Do</th>
                    </tr>
                  </thead>
                  <tbody>
                    {list.map((login) => (
                      <LoginRow key={login.id} login={login} />
                    ))}
                  </tbody>
                </table>
              )}
            </Loaded>
          </div>
        </div>
      </RailPage>
      {isInviting ? <InviteSheet onClose={() => setInviting(false)} /> : null}
    </>
  );
}

function LoginRow({ login }: { login: LoginDto }) {
  const client = useQueryClient();
  const { user } = useSession();
  const [said, setSaid] = useState('');
  const change = useMutation({
    mutationFn: (body: { role?: Role; isActive?: boolean }) => call(updateLogin, { params: { id: login.id }, body }),
    onSettled: () => client.invalidateQueries({ queryKey: ['logins'] }),
  });
  const send = useMutation({
    mutationFn: () => call(sendReset, { params: { id: login.id } }),
    onSuccess: () => setSaid('Link sent'),
  });
  const end = useMutation({
    mutationFn: () => call(endLoginSessions, { params: { id: login.id } }),
    onSuccess: () => setSaid('Sessions ended'),
  });
  const error = change.error ?? send.error ?? end.error;
  return (
    <tr>
      <td>
        <b>{login.name}</b>
        {login.id === user.id ? ' (you)' : ''}
      </td>
      <td>{login.email}</td>
      <td>
        <select
          className="inp !w-auto"
          aria-label={`Role of ${login.name}`}
          value={login.role}
          onChange={(event) => change.mutate({ role: event.target.value as Role })}
        >
          {roles.map((role) => (
            <option key={role} value={role}>
              {role}
            </option>
          ))}
        </select>
      </td>
      <td>
        {login.isActive ? (login.isInvited ? 'Invited' : 'On') : 'Off'}
        {error ? (
          <p className="tape" role="alert">
            {error.message}
          </p>
        ) : null}
        {said ? <p role="status">{said}</p> : null}
      </td>
      <td className="r">
        <Button look="bare" onClick={() => send.mutate()} disabled={!login.isActive}>
          Send link
        </Button>
        <Button look="bare" onClick={() => end.mutate()}>
          End sessions
        </Button>
        <Button look="bare" onClick={() => change.mutate({ isActive: !login.isActive })}>
          {login.isActive ? 'Switch off' : 'Switch on'}
        </Button>
      </td>
    </tr>
  );
}

function InviteSheet({ onClose }: { onClose: () => void }) {
  const client = useQueryClient();
  const [name, setName] = useState('');
  const [email, setEmail] = useState('');
  const [role, setRole] = useState<Role>('technician');
  const [personId, setPersonId] = useState('');
  const people = useQuery({ queryKey: ['people'], queryFn: ({ signal }) => call(listPeople, {}, signal) });
  const invite = useMutation({
    mutationFn: () => call(inviteLogin, { body: { name, email, role, personId: personId || null } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['logins'] }).then(onClose),
  });
  const fields = fieldsOf(invite.error);
  return (
    <Sheet title="Invite" onClose={onClose} width={520}>
      <form
        className="grid gap-3"
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          if (!invite.isPending) invite.mutate();
        }}
      >
        <SelectField
          label="Person"
          value={personId}
          hint="Someone with a run sheet, a clock and pay. None for an office login."
          onChange={(event) => {
            setPersonId(event.target.value);
            const person = people.data?.people.find((p) => p.id === event.target.value);
            if (person && name === '') setName(person.name);
          }}
        >
          <option value="">None</option>
          {people.data?.people
            .filter((person) => person.loginRole === null && person.isActive)
            .map((person) => (
              <option key={person.id} value={person.id}>
                {person.name}
              </option>
            ))}
        </SelectField>
        <TextField label="Name" value={name} error={fields['name']} onChange={(event) => setName(event.target.value)} />
        <TextField
          label="E-mail"
          type="email"
          value={email}
          error={fields['email']}
          onChange={(event) => setEmail(event.target.value)}
        />
        <SelectField label="Role" value={role} onChange={(event) => setRole(event.target.value as Role)}>
          {roles.map((value) => (
            <option key={value} value={value}>
              {value}
            </option>
          ))}
        </SelectField>
        <FormFault error={invite.error} fields={fields} />
        <SheetFoot>
          <Button type="submit" look="main" isBusy={invite.isPending}>
            Send the invitation
          </Button>
        </SheetFoot>
      </form>
    </Sheet>
  );
}
