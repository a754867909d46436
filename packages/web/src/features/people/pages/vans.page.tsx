import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { equipmentKinds, equipmentNames } from '@driprail/shared/contracts/fields';
import type { Equipment } from '@driprail/shared/contracts/fields';
import type { VanDto } from '@driprail/shared/contracts/people.contract';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextArea, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { useSaveVan, vansQuery } from '../api/people.queries.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

/** The vans and what they carry. Their crews are set by day, at the head of each lane of the board. */
export function VansPage() {
  const [editing, setEditing] = useState<VanDto | 'new' | null>(null);
  const vans = useQuery(vansQuery);
  return (
    <>
      <PageHead
        title="Vans"
        above="What each carries. Crews are set by day on the board"
        sums={[{ label: 'On the road', value: vans.data?.vans.filter((v) => v.isActive).length ?? '–' }]}
        actions={
          <Button look="main" onClick={() => setEditing('new')}>
            <Icon name="plus" /> New van
          </Button>
        }
      />
      <RailPage>
        <Loaded query={vans} what="the vans">
          {({ vans: list }) =>
            list.length === 0 ? (
              <Empty>No vans yet. Each van becomes a lane of the board.</Empty>
            ) : (
              <div className="grid grid-cols-[repeat(auto-fill,minmax(300px,1fr))] gap-x-4 gap-y-9 pt-1">
                {list.map((van) => (
                  <section
                    key={van.id}
                    className={`hung p-5 ${van.isActive ? '' : 'opacity-60'}`}
                    aria-label={van.name}
                  >
                    <h2 className="t-hang text-[44px] leading-[40px]">{van.name}</h2>
                    <p className="t-2 mb-2">
                      {van.plate ? `Plate ${van.plate}` : 'No plate on record'}
                      {van.isActive ? '' : '. Off the road'}
                    </p>
                    <ul className="list-none p-0 m-0">
                      {equipmentKinds.map((tool) => (
                        <li
                          key={tool}
                          className={`border-t border-line py-1 flex justify-between ${van.equipment.includes(tool) ? '' : 't-3'}`}
                        >
                          <span>{equipmentNames[tool]}</span>
                          <span>{van.equipment.includes(tool) ? 'aboard' : '–'}</span>
                        </li>
                      ))}
                    </ul>
                    {van.notes ? <p className="mt-2">{van.notes}</p> : null}
                    <Button className="mt-3" onClick={() => setEditing(van)}>
                      <Icon name="pen" /> Edit {van.name}
                    </Button>
                  </section>
                ))}
              </div>
            )
          }
        </Loaded>
      </RailPage>
      {editing ? (
        <Sheet title={editing === 'new' ? 'New van' : editing.name} onClose={() => setEditing(null)} width={520}>
          <VanForm
            van={editing === 'new' ? null : editing}
            nextPosition={vans.data?.vans.length ?? 0}
            onDone={() => setEditing(null)}
          />
        </Sheet>
      ) : null}
    </>
  );
}

function VanForm({ van, nextPosition, onDone }: { van: VanDto | null; nextPosition: number; onDone: () => void }) {
  const save = useSaveVan();
  const [value, setValue] = useState({
    name: van?.name ?? '',
    plate: van?.plate ?? '',
    equipment: van?.equipment ?? [],
    notes: van?.notes ?? '',
    position: van?.position ?? nextPosition,
    isActive: van?.isActive ?? true,
  });
  const fields = fieldsOf(save.error);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!save.isPending)
          save.mutate({ id: van?.id ?? null, version: van?.version ?? 0, body: value }, { onSuccess: onDone });
      }}
    >
      <div className="grid grid-cols-[1fr_1fr_80px] gap-3">
        <TextField
          label="Name"
          value={value.name}
          error={fields['name']}
          onChange={(event) => setValue({ ...value, name: event.target.value })}
        />
        <TextField
          label="Plate"
          value={value.plate}
          error={fields['plate']}
          onChange={(event) => setValue({ ...value, plate: event.target.value })}
        />
        <TextField
          label="Lane"
          type="number"
          value={value.position}
          error={fields['position']}
          onChange={(event) => setValue({ ...value, position: Number(event.target.value) })}
        />
      </div>
      <fieldset className="mt-3">
        <legend className="sec w-full">Aboard</legend>
        {equipmentKinds.map((tool: Equipment) => (
          <CheckField
            key={tool}
            label={equipmentNames[tool]}
            checked={value.equipment.includes(tool)}
            onChange={(event) =>
              setValue({
                ...value,
                equipment: event.target.checked
                  ? [...value.equipment, tool]
                  : value.equipment.filter((t) => t !== tool),
              })
            }
          />
        ))}
      </fieldset>
      <TextArea
        className="mt-3"
        label="Notes"
        value={value.notes}
        error={fields['notes']}
        onChange={(event) => setValue({ ...value, notes: event.target.value })}
      />
      <CheckField
        label="On the road"
        checked={value.isActive}
        onChange={(event) => setValue({ ...value, isActive: event.target.checked })}
      />
      <FormFault error={save.error} fields={fields} className="mt-3" />
      <SheetFoot>
        <Button type="submit" look="main" isBusy={save.isPending}>
          {van ? 'Save van' : 'Add van'}
        </Button>
      </SheetFoot>
    </form>
  );
}
