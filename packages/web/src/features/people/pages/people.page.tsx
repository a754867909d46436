import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { skillNames } from '@driprail/shared/contracts/fields';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { peopleQuery } from '../api/people.queries.ts';
import { PersonForm } from '../components/person-form.tsx';

export function PeoplePage() {
  const [editingId, setEditingId] = useState<string | null>(null);
  const people = useQuery(peopleQuery);
  const editing = people.data?.people.find((person) => person.id === editingId) ?? null;
  return (
    <>
      <PageHead
        title="People"
        above="Skills, standing and time off"
        sums={[{ label: 'Working here', value: people.data?.people.filter((p) => p.isActive).length ?? '–' }]}
        actions={
          <Button look="main" onClick={() => setEditingId('new')}>
            <Icon name="plus" /> New person
          </Button>
        }
      />
      <RailPage>
        <div className="hung p-5 max-w-[1100px]">
          <div className="scroll-x">
            <Loaded query={people} what="the people">
              {({ people: list }) =>
                list.length === 0 ? (
                  <Empty>Nobody yet. Add who works here; a crew and a login come after.</Empty>
                ) : (
                  <table className="grid-t stacks min-w-[640px] max-[900px]:min-w-0">
                    <thead>
                      <tr>
                        <th>Name</th>
                        <th>Phone</th>
                        <th>Skills</th>
                        <th>Login</th>
                        <th>Time off</th>
                        <th className="r">Change</th>
                      </tr>
                    </thead>
                    <tbody>
                      {list.map((person) => (
                        <tr key={person.id} className={person.isActive ? '' : 't-3'}>
                          <td>
                            <b>{person.name}</b>
                            {person.isTrainee ? ', trainee' : ''}
                            {person.isActive ? '' : ', left'}
                          </td>
                          <td>{person.phone}</td>
                          <td>{person.skills.map((skill) => skillNames[skill]).join(', ')}</td>
                          <td>{person.loginRole}</td>
                          <td>
                            {person.timeOff[0]
                              ? `Off from ${formatDate(person.timeOff[0].startsOn)}${person.timeOff.length > 1 ? ' and more' : ''}`
                              : null}
                          </td>
                          <td className="r">
                            <Button look="bare" onClick={() => setEditingId(person.id)}>
                              <Icon name="pen" /> Edit
                            </Button>
                          </td>
                        </tr>
                      ))}
                    </tbody>
                  </table>
                )
              }
            </Loaded>
          </div>
        </div>
      </RailPage>
      {editingId !== null && (editingId === 'new' || editing) ? (
        <Sheet title={editing?.name ?? 'New person'} onClose={() => setEditingId(null)} width={640}>
          <PersonForm person={editing} onDone={() => setEditingId(null)} />
        </Sheet>
      ) : null}
    </>
  );
}
