import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { ErasurePreview } from '@driprail/shared/contracts/customers-data.contract';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { FormError } from '../../../components/form-error.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { erasureQuery, useErase } from '../api/data.queries.ts';

interface EraseSheetProps {
  id: string;
  onErased: () => void;
  onClose: () => void;
}

/** Asked twice: first what goes and what stays, then the name once more. */
export function EraseSheet({ id, onErased, onClose }: EraseSheetProps) {
  const erase = useErase(id);
  // While it is done, and after, there is nothing to look at any more.
  const preview = useQuery({ ...erasureQuery(id), enabled: !erase.isPending && !erase.isSuccess });
  const [isSure, setSure] = useState(false);
  return (
    <Sheet title="Erase a customer" onClose={onClose} width={680}>
      <Loaded query={preview} what="what would go">
        {(shown) =>
          isSure ? (
            <LastWord erase={erase} shown={shown} onErased={onErased} onClose={onClose} />
          ) : (
            <>
              <WhatGoes shown={shown} />
              {shown.hindrance ? (
                <p className="tape mt-3" role="alert">
                  <b>{shown.hindrance}</b>
                </p>
              ) : null}
              <SheetFoot>
                <Button onClick={onClose}>Leave the record</Button>
                <Button disabled={shown.hindrance !== null} onClick={() => setSure(true)}>
                  Go on to erase
                </Button>
              </SheetFoot>
            </>
          )
        }
      </Loaded>
    </Sheet>
  );
}

function WhatGoes({ shown: { name, nameAfter, goes, stays } }: { shown: ErasurePreview }) {
  return (
    <>
      <p>
        <b dir="auto">{name}</b> will be called “{nameAfter}”.
      </p>
      <h3 className="sec mt-3">What goes</h3>
      <ul className="cu-moves">
        <li>Name, phone, e-mail, notes, tags, consents and preferred crew</li>
        <li>
          Street, map place, gate code, access notes and permit of {counted(goes.addresses, 'address', 'addresses')}
        </li>
        <li>Plate, VIN and notes of {counted(goes.vehicles, 'vehicle', 'vehicles')}</li>
        <li>
          {goes.photos > 0 ? `${counted(goes.photos, 'photo', 'photos')} and the` : 'The'} initials on walk-rounds
        </li>
        <li>Mail kept for sending, notes on jobs, and links to bills</li>
      </ul>
      <h3 className="sec mt-3">What stays, without the name</h3>
      <ul className="cu-moves">
        <li>
          {counted(stays.jobs, 'job', 'jobs')} with their times and amounts, and{' '}
          {counted(stays.invoices, 'invoice', 'invoices')} with number, town and tax
        </li>
        <li>What crews noted in their own words while they worked</li>
        <li>Backups made before today, until they are thrown away</li>
      </ul>
      <p className="mt-3">
        A bill that is not paid can’t be claimed by name afterwards. What must be kept, and how long, is for the law to
        say. This can’t be undone.
      </p>
    </>
  );
}

interface LastWordProps extends Omit<EraseSheetProps, 'id'> {
  erase: ReturnType<typeof useErase>;
  shown: ErasurePreview;
}

function LastWord({ erase, shown, onErased, onClose }: LastWordProps) {
  const [name, setName] = useState('');
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        erase.mutate({ version: shown.version, name }, { onSuccess: onErased });
      }}
    >
      <TextField
        label={
          <>
            Type the name to erase it: <bdi>{shown.name}</bdi>
          </>
        }
        dir="auto"
        autoFocus
        autoComplete="off"
        value={name}
        onChange={({ target }) => setName(target.value)}
        error={fieldsOf(erase.error)['name']}
      />
      <FormError error={erase.error} />
      <SheetFoot>
        <Button onClick={onClose}>Leave the record</Button>
        <Button type="submit" look="main" isBusy={erase.isPending} disabled={name.trim() === ''}>
          <span>
            Erase <bdi>{shown.name}</bdi>
          </span>
        </Button>
      </SheetFoot>
    </form>
  );
}

function counted(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}
