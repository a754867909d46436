import { stageNames } from '@driprail/shared/domain/job-work/stages';
import { stepCaseNames, towelUseNames } from '@driprail/shared/domain/job-work/step';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { StepFields } from './step-fields.tsx';

interface StepLineProps {
  step: CheckStep;
  index: number;
  isFirstOfStage: boolean;
  isOpen: boolean;
  canEdit: boolean;
  errorOf: (field: string) => string | undefined;
  onOpen: () => void;
  onChange: (step: CheckStep) => void;
  onMove: (by: 1 | -1) => void;
  onRemove: () => void;
}

/** One step of the list; opened it shows its fields. */
export function StepLine(props: StepLineProps) {
  const { step, index, isFirstOfStage, isOpen, canEdit, errorOf, onOpen, onChange, onMove, onRemove } = props;
  const name = step.words || 'New step';
  return (
    <li>
      {isFirstOfStage ? <h3 className="sec">{stageNames[step.stage]}</h3> : null}
      <div className="row">
        <b className="no">{index + 1}</b>
        <span>
          {step.words || <em>New step</em>}
          {step.isAlone ? <span className="t-2"> (ticked by itself)</span> : null}
          {needsOf(step) ? <span className="t-2 block">{needsOf(step)}</span> : null}
          {step.caution ? <span className="t-2 block">Care: {step.caution}</span> : null}
        </span>
        {canEdit ? (
          <span className="acts">
            <Button look="bare" aria-label={`Move up: ${name}`} onClick={() => onMove(-1)}>
              <Icon name="up" />
            </Button>
            <Button look="bare" aria-label={`Move down: ${name}`} onClick={() => onMove(1)}>
              <Icon name="dn" />
            </Button>
            <Button look="bare" aria-expanded={isOpen} onClick={onOpen}>
              <Icon name="pen" /> {isOpen ? 'Close' : 'Change'}
            </Button>
            <Button look="bare" aria-label={`Take off: ${name}`} onClick={onRemove}>
              <Icon name="x" />
            </Button>
          </span>
        ) : null}
      </div>
      {isOpen && canEdit ? <StepFields step={step} errorOf={errorOf} onChange={onChange} /> : null}
    </li>
  );
}

function needsOf({ product, ratio, pour, dose, kitCase, towel }: CheckStep): string {
  const from = pour === 'dose' ? `dosed, ${dose}` : pour === 'bottle' ? 'from the bottle' : '';
  return [
    [product, ratio].filter(Boolean).join(' '),
    product ? from : '',
    kitCase ? stepCaseNames[kitCase].toLowerCase() : '',
    towel ? `${towelUseNames[towel.use].toLowerCase()} ${towel.color}` : '',
  ]
    .filter(Boolean)
    .join(', ');
}
