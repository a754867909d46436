import { useDeferredValue, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { OutputOf } from '@driprail/shared/contracts/endpoint';
import type { PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import type { PayPlan } from '@driprail/shared/domain/pay/plans/pay-plan';
import type { whatIf } from '@driprail/shared/contracts/pay-plans.contract';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { Loaded } from '../../../components/states.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { placesQuery, ruleSetsQuery, whatIfQuery } from '../api/plans.queries.ts';
import { basePlanWords } from './plan-base-words.ts';
import { splitWords } from './rate-bands.ts';
import { WhatIfTable } from './what-if-table.tsx';
import './what-if.css';

const crewSplits = ['equal', 'weights', 'minutes'] as const;

export type Tried = OutputOf<typeof whatIf>['weeks'];

interface Props {
  person: { id: string; name: string };
  /** Weeks that are over, oldest first. */
  weeks: PayWeekHead[];
  /** Rates of today, shown beside the fields. */
  now: { hourly: string; percent: string };
  plan: PayPlan | null;
  onChoosePlan: () => void;
  onDropPlan: () => void;
}

/** Other pay tried on past weeks, side by side with what was paid. Nothing is saved, nobody is told. */
export function WhatIf({ person, weeks, now, plan, onChoosePlan, onDropPlan }: Props) {
  const ruleSets = useQuery(ruleSetsQuery).data?.ruleSets ?? [];
  const [trial, setTrial] = useState({ hourly: '', percent: '', where: '', minimumWage: '', crewSplit: '' });
  const places = useQuery(placesQuery).data?.places ?? [];
  const [from, setFrom] = useState(weeks.at(-8)?.startsOn ?? weeks[0]?.startsOn ?? '');
  const to = weeks.at(-1)?.startsOn ?? '';
  const figure = (text: string) => text.replace(/[$%,\s]/g, '') || null;
  const body = useDeferredValue({
    ...{ personId: person.id, from, to, plan },
    ...{ hourly: figure(trial.hourly), percent: figure(trial.percent), minimumWage: figure(trial.minimumWage) },
    placeId: places.some((place) => place.id === trial.where) ? trial.where : null,
    ruleSetKey: ruleSets.some((set) => set.key === trial.where) ? trial.where : null,
    crewSplit: crewSplits.find((split) => split === trial.crewSplit) ?? null,
  });
  const answer = useQuery({ ...whatIfQuery(body), enabled: from !== '' });
  const fields = fieldsOf(answer.error);
  const hasFields = Object.keys(fields).length > 0;
  return (
    <section className="hung wi" aria-labelledby="what-if">
      <header>
        <h2 className="t-hang" id="what-if">
          What if
        </h2>
        <TextField
          label="An hour"
          inputMode="decimal"
          placeholder={`now ${now.hourly}`}
          value={trial.hourly}
          error={fields['hourly']}
          onChange={(event) => setTrial({ ...trial, hourly: event.target.value })}
        />
        <TextField
          label="Commission, percent"
          inputMode="decimal"
          placeholder={`now ${now.percent}`}
          value={trial.percent}
          error={fields['percent']}
          onChange={(event) => setTrial({ ...trial, percent: event.target.value })}
        />
        <SelectField
          label="Place or overtime rules"
          value={trial.where}
          error={fields['ruleSetKey']}
          onChange={(event) => setTrial({ ...trial, where: event.target.value })}
        >
          <option value="">as they are</option>
          {places.length > 0 ? (
            <optgroup label="Places">
              <NamedOptions of={places} />
            </optgroup>
          ) : null}
          <optgroup label="Overtime rules">
            {ruleSets.map((set) => (
              <option key={set.key} value={set.key}>
                {set.name}
              </option>
            ))}
          </optgroup>
        </SelectField>
        <TextField
          label="Minimum wage"
          inputMode="decimal"
          placeholder="as it was"
          value={trial.minimumWage}
          error={fields['minimumWage']}
          onChange={(event) => setTrial({ ...trial, minimumWage: event.target.value })}
        />
        <SelectField
          label="In a crew"
          value={trial.crewSplit}
          error={fields['crewSplit']}
          onChange={(event) => setTrial({ ...trial, crewSplit: event.target.value })}
        >
          <option value="">shared as it was</option>
          {crewSplits.map((split) => (
            <option key={split} value={split}>
              {splitWords[split].toLowerCase()}
            </option>
          ))}
        </SelectField>
        <SelectField label="On past weeks" value={from} onChange={(event) => setFrom(event.target.value)}>
          {weeks.slice(-26).map((week) => (
            <option key={week.startsOn} value={week.startsOn}>
              {week.number} to {weeks.at(-1)?.number}
            </option>
          ))}
        </SelectField>
      </header>
      <p className="wi-plan">
        {plan ? (
          <>
            <b>{basePlanWords(plan)}</b>
            <Button look="bare" onClick={onDropPlan}>
              Drop the plan
            </Button>
          </>
        ) : null}
        <Button onClick={onChoosePlan}>{plan ? 'Try another plan' : 'Try a plan'}</Button>
      </p>
      {hasFields ? null : (
        <Loaded query={answer} what="the trial">
          {({ weeks: tried }) => (
            <div className={answer.isPlaceholderData ? 'is-old' : ''} aria-busy={answer.isPlaceholderData}>
              <WhatIfTable name={person.name} weeks={tried} />
            </div>
          )}
        </Loaded>
      )}
      <p className="t-2">
        Overtime is worked again on each week’s own regular rate. A trial only: nothing is saved, nobody is told. Tips
        and adjustments stay out.
      </p>
    </section>
  );
}
