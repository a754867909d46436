import { useState } from 'react';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import type { PayPlan, PlanKind } from '@driprail/shared/domain/pay/plans/pay-plan';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useAddPlan } from '../api/plans.queries.ts';
import { OtherTimeFields, PlanBaseFields } from './plan-base-fields.tsx';
import { EMPTY_PLAN, moreKinds, plainKinds, planKinds, planOf } from './plan-draft.ts';
import type { PlanDraft } from './plan-draft.ts';
import { PlanMoreFields } from './plan-more-fields.tsx';
import { ServiceRows } from './service-rows.tsx';

interface Props {
  people: PersonDto[];
  services: ServiceDto[];
  personId: string | null;
  startsOn: string;
  onDone: (personId: string) => void;
  /** Given when the plan is only tried on past weeks. */
  onTry?: (plan: PayPlan) => void;
}

/** A person's plan from a workweek on, or one to try. */
export function PlanForm({ people, services, personId, startsOn, onDone, onTry }: Props) {
  const add = useAddPlan();
  const [who, setWho] = useState({ personId: personId ?? '', startsOn });
  const [draft, setDraft] = useState<PlanDraft>(EMPTY_PLAN);
  const [faults, setFaults] = useState<Record<string, string>>({});
  const answered = fieldsOf(add.error);
  const fault = (path: string) => faults[path] ?? answered[`plan.${path}`];
  const onChange = (part: Partial<PlanDraft>) => setDraft({ ...draft, ...part });
  const words = planKinds[draft.kind];
  const submit = () => {
    const { plan, faults: found } = planOf(draft);
    setFaults(found ?? {});
    if (plan === null || add.isPending) return;
    if (onTry) onTry(plan);
    else add.mutate({ ...who, plan }, { onSuccess: () => onDone(who.personId) });
  };
  const flatFault = (key: string) => fault(key === '' ? 'extras.flats' : `extras.flats.${key}`);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      {onTry ? null : (
        <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
          <SelectField
            label="For"
            value={who.personId}
            error={answered['personId']}
            onChange={(event) => setWho({ ...who, personId: event.target.value })}
          >
            <option value="">Choose the person</option>
            <NamedOptions of={people} />
          </SelectField>
          <TextField
            label="From, the first day of a workweek"
            type="date"
            value={who.startsOn}
            error={answered['startsOn']}
            onChange={(event) => setWho({ ...who, startsOn: event.target.value })}
          />
        </div>
      )}
      <SelectField
        className="mt-3"
        label="Paid"
        value={draft.kind}
        hint={words.hint}
        onChange={(event) => onChange({ kind: event.target.value as PlanKind })}
      >
        {plainKinds.map((kind) => (
          <option key={kind} value={kind}>
            {planKinds[kind].label}
          </option>
        ))}
        <optgroup label="More">
          {moreKinds.map((kind) => (
            <option key={kind} value={kind}>
              {planKinds[kind].label}
            </option>
          ))}
        </optgroup>
      </SelectField>
      <PlanBaseFields draft={draft} fault={fault} onChange={onChange} />
      {draft.kind === 'rates' ? null : (
        <>
          {words.hasOther ? <OtherTimeFields draft={draft} fault={fault} onChange={onChange} /> : null}
          <ServiceRows
            label={draft.kind === 'flat_with_floor' ? 'Flat amounts per finished line' : 'Flat amounts on top, if any'}
            amountLabel="Dollars a line"
            hasSizes
            services={services}
            rows={draft.flats}
            fault={flatFault}
            onChange={(flats) => onChange({ flats })}
          />
          <PlanMoreFields draft={draft} fault={fault} onChange={onChange} services={services} />
        </>
      )}
      <p className="t-2 mt-3">
        Every week is made up to the minimum wage on its own payday, and overtime is worked on all of it. How a change
        of pay is told, and whether a plan is allowed, is for state law: ask a licensed adviser.
      </p>
      {add.error && Object.keys(answered).length === 0 ? (
        <p className="tape mt-3" role="alert">
          {add.error.message}
        </p>
      ) : null}
      <SheetFoot>
        <Button type="submit" look="main" isBusy={add.isPending}>
          {onTry ? 'Try plan' : 'Add plan'}
        </Button>
      </SheetFoot>
    </form>
  );
}
