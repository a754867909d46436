import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import type { ChecklistDto } from '@driprail/shared/contracts/checklist.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { inOrderOfWork, stages } from '@driprail/shared/domain/job-work/stages';
import type { Stage } from '@driprail/shared/domain/job-work/stages';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { CheckField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useFormats } from '../../../lib/format.ts';
import { checklistQuery, useSaveChecklist } from '../api/checklists.queries.ts';
import { StepLine } from './step-line.tsx';
import './checklist.css';

/** A service's steps in order of work. Each save is a new version; visits under way keep theirs. */
export function ChecklistSheet({
  service,
  canEdit,
  onClose,
}: {
  service: ServiceDto;
  canEdit: boolean;
  onClose: () => void;
}) {
  const query = useQuery(checklistQuery(service.id));
  return (
    <Sheet title={`${service.name}, steps`} onClose={onClose} width={760}>
      <Loaded query={query} what="the steps">
        {({ checklist }) => (
          <Checklist key={checklist.version} checklist={checklist} canEdit={canEdit} onClose={onClose} />
        )}
      </Loaded>
    </Sheet>
  );
}

interface ChecklistProps {
  checklist: ChecklistDto;
  canEdit: boolean;
  onClose: () => void;
}

function Checklist({ checklist, canEdit, onClose }: ChecklistProps) {
  const { zone } = useFormats();
  const save = useSaveChecklist(checklist.serviceId);
  const [steps, setSteps] = useState<CheckStep[]>(checklist.steps);
  const [asksNote, setAsksNote] = useState(checklist.asksNote);
  const [openId, setOpenId] = useState<string | null>(null);
  const fields = fieldsOf(save.error);
  const put = (step: CheckStep) => {
    // Back to how it was sent once something is changed: the sentences belong to what was sent.
    save.reset();
    setSteps(inOrderOfWork(steps.map((one) => (one.id === step.id ? step : one))));
  };
  const add = () => {
    const step = emptyStep(steps.at(-1)?.stage ?? stages[1]);
    save.reset();
    setSteps([...steps, step]);
    setOpenId(step.id);
  };
  const move = (id: string, by: 1 | -1) => {
    const from = steps.findIndex((one) => one.id === id);
    const to = steps[from + by];
    const step = steps[from];
    // Stages keep their order: a step moves inside its own.
    if (!step || to?.stage !== step.stage) return;
    setSteps(steps.map((one, index) => (index === from ? to : index === from + by ? step : one)));
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!save.isPending) save.mutate({ version: checklist.version, asksNote, steps }, { onSuccess: onClose });
      }}
    >
      <p className="t-2 mb-2">
        {checklist.savedAt
          ? `Version ${checklist.version}, ${formatDate(dayOf(checklist.savedAt, zone))}${checklist.savedBy ? `, ${checklist.savedBy}` : ''}.`
          : 'No steps yet.'}{' '}
        Visits whose work has started keep the steps they began with.
      </p>
      {steps.length === 0 ? <Empty>Add the first step; stages put themselves in order of work.</Empty> : null}
      <ol className="cl">
        {steps.map((step, index) => (
          <StepLine
            key={step.id}
            step={step}
            index={index}
            isFirstOfStage={steps[index - 1]?.stage !== step.stage}
            isOpen={openId === step.id || Object.keys(fields).some((path) => path.startsWith(`steps.${index}.`))}
            canEdit={canEdit}
            errorOf={(field) => fields[`steps.${index}.${field}`]}
            onOpen={() => setOpenId(openId === step.id ? null : step.id)}
            onChange={put}
            onMove={(by) => move(step.id, by)}
            onRemove={() => setSteps(steps.filter((one) => one.id !== step.id))}
          />
        ))}
      </ol>
      {canEdit ? (
        <>
          <Button className="mt-3" onClick={add}>
            <Icon name="plus" /> Add a step
          </Button>
          <CheckField
            label="Done asks the crew for a note"
            checked={asksNote}
            onChange={(event) => setAsksNote(event.target.checked)}
          />
          <FormFault error={save.error} fields={fields} />
          <SheetFoot>
            <Button onClick={onClose}>Leave</Button>
            <Button type="submit" look="main" isBusy={save.isPending}>
              Save steps
            </Button>
          </SheetFoot>
        </>
      ) : (
        <p className="t-2 py-3">
          {checklist.asksNote ? 'Done asks the crew for a note. ' : ''}The owner changes the steps.
        </p>
      )}
    </form>
  );
}

function emptyStep(stage: Stage): CheckStep {
  return {
    ...{ id: uuid(), stage, words: '', product: '', ratio: '', pour: null, dose: '', kitCase: null },
    ...{ towel: null, caution: '', isAlone: false },
  };
}
