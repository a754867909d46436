import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { HandoverWeek, PaydayDto } from '@driprail/shared/contracts/handover.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../../components/button.tsx';
import { Icon } from '../../../../components/icon.tsx';
import { Sheet, SheetFoot } from '../../../../components/sheet.tsx';
import { Loaded } from '../../../../components/states.tsx';
import { money, useFormats } from '../../../../lib/format.ts';
import { paydayQuery, useHandOver, useRemovePayday } from '../../api/paydays.queries.ts';
import { HandoverFiles } from './handover-files.tsx';
import { PaydayForm } from './payday-form.tsx';
import { PaydayTable } from './payday-table.tsx';
import { weekNames } from './payday-model.ts';

interface Props {
  payday: PaydayDto;
  waiting: readonly HandoverWeek[];
  onRemoved: () => void;
}

/** A payday on its hung sheet: who gets what, the files, and handing it over. */
export function PaydaySheet({ payday, waiting, onRemoved }: Props) {
  const { zone } = useFormats();
  const [open, setOpen] = useState<'change' | 'remove' | 'hand-over' | null>(null);
  const people = useQuery(paydayQuery(payday.id));
  const close = () => setOpen(null);
  const date = formatDate(payday.paysOn);
  return (
    <section className="hung pd-sheet" aria-label={`Payday of ${date}`}>
      <h2 className="t-hang">{date}</h2>
      <p className="who">
        <span>
          {weekNames(payday.weeks)}
          {payday.note ? `. ${payday.note}` : ''}
        </span>
        <span>
          {payday.handedOverAt
            ? `Handed over ${formatDate(dayOf(payday.handedOverAt, zone))} by ${payday.handedOverBy}`
            : 'Not handed over yet'}
        </span>
      </p>
      <h3 className="sec">Files for the payroll processor</h3>
      <HandoverFiles base={`/api/pay/paydays/${payday.id}`} name={`payday-${payday.paysOn}`} />
      {payday.handedOverAt ? null : (
        <div className="pd-foot">
          <Button look="seal" onClick={() => setOpen('hand-over')}>
            <Icon name="lock" /> Mark as handed over
          </Button>
          <Button onClick={() => setOpen('change')}>Change payday</Button>
          <Button look="bare" onClick={() => setOpen('remove')}>
            Take payday away
          </Button>
        </div>
      )}
      <Loaded query={people} what="who is paid">
        {(found) => (
          <div className="pd-scroll">
            <PaydayTable payday={found.payday} people={found.people} />
          </div>
        )}
      </Loaded>
      {open === 'change' ? (
        <Sheet title={date} onClose={close} width={520}>
          <PaydayForm payday={payday} weeks={byStart([...payday.weeks, ...waiting])} onDone={close} />
        </Sheet>
      ) : null}
      {open === 'hand-over' ? <HandOver payday={payday} onClose={close} /> : null}
      {open === 'remove' ? <Remove payday={payday} onClose={close} onRemoved={onRemoved} /> : null}
    </section>
  );
}

function HandOver({ payday, onClose }: { payday: PaydayDto; onClose: () => void }) {
  const mark = useHandOver(payday);
  const gross = payday.weeks.reduce((total, week) => total + week.grossCents, 0);
  return (
    <Sheet title="Mark as handed over" onClose={onClose} width={520}>
      <p className="text-[15px] leading-[22px]">
        {weekNames(payday.weeks)}, {money(gross)} gross, for the payday of {formatDate(payday.paysOn)}.
      </p>
      <p className="mt-2 text-[15px] leading-[22px]">
        From then on nothing in this payday changes, and its weeks stay on it. Mark it once the processor has the files.
      </p>
      <Refusal error={mark.error} />
      <SheetFoot>
        <Button onClick={onClose}>Not yet</Button>
        <Button look="seal" isBusy={mark.isPending} onClick={() => mark.mutate(undefined, { onSuccess: onClose })}>
          <Icon name="lock" /> Mark as handed over
        </Button>
      </SheetFoot>
    </Sheet>
  );
}

function Remove({ payday, onClose, onRemoved }: { payday: PaydayDto; onClose: () => void; onRemoved: () => void }) {
  const remove = useRemovePayday(payday);
  return (
    <Sheet title="Take payday away" onClose={onClose} width={520}>
      <p className="text-[15px] leading-[22px]">
        {weekNames(payday.weeks)} {payday.weeks.length === 1 ? 'waits' : 'wait'} again for a payday. Locked pay stays as
        it is.
      </p>
      <Refusal error={remove.error} />
      <SheetFoot>
        <Button onClick={onClose}>Keep it</Button>
        <Button
          look="main"
          isBusy={remove.isPending}
          onClick={() => remove.mutate(undefined, { onSuccess: onRemoved })}
        >
          Take payday away
        </Button>
      </SheetFoot>
    </Sheet>
  );
}

function Refusal({ error }: { error: Error | null }) {
  return error ? (
    <p className="tape mt-3" role="alert">
      {error.message}
    </p>
  ) : null;
}

function byStart(weeks: HandoverWeek[]): HandoverWeek[] {
  return weeks.sort((a, b) => a.startsOn.localeCompare(b.startsOn));
}
