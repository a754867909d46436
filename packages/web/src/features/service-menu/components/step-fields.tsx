import { stageNames, stages } from '@driprail/shared/domain/job-work/stages';
import type { Stage } from '@driprail/shared/domain/job-work/stages';
import { stepCaseNames, stepCases, towelUseNames, towelUses } from '@driprail/shared/domain/job-work/step';
import type { CheckStep, TowelUse } from '@driprail/shared/domain/job-work/step';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { RatioField } from './ratio-field.tsx';

interface StepFieldsProps {
  step: CheckStep;
  errorOf: (field: string) => string | undefined;
  onChange: (step: CheckStep) => void;
}

/** What a step says and needs. Products are named in the house's own words. */
export function StepFields({ step, errorOf, onChange }: StepFieldsProps) {
  const put = (more: Partial<CheckStep>) => onChange({ ...step, ...more });
  const towel = (use: TowelUse | '', color: string) => put({ towel: use === '' ? null : { use, color } });
  return (
    <div className="fields">
      <SelectField
        label="Stage"
        value={step.stage}
        error={errorOf('stage')}
        onChange={(event) => put({ stage: event.target.value as Stage })}
      >
        {stages.map((stage) => (
          <option key={stage} value={stage}>
            {stageNames[stage]}
          </option>
        ))}
      </SelectField>
      <TextField
        className="wide"
        label="What is done"
        autoFocus={step.words === ''}
        value={step.words}
        error={errorOf('words')}
        onChange={(event) => put({ words: event.target.value })}
      />
      <TextField
        label="Product"
        value={step.product}
        error={errorOf('product')}
        onChange={(event) => put({ product: event.target.value })}
      />
      <RatioField value={step.ratio} error={errorOf('ratio')} onChange={(ratio) => put({ ratio })} />
      <SelectField
        label="Taken"
        value={step.pour ?? ''}
        onChange={(event) =>
          put({ pour: event.target.value === '' ? null : (event.target.value as 'bottle' | 'dose') })
        }
      >
        <option value="">no product</option>
        <option value="bottle">from a mixed bottle</option>
        <option value="dose">as a dose at the car</option>
      </SelectField>
      {step.pour === 'dose' ? (
        <TextField
          label="Dose"
          placeholder="4 oz in a 4 gallon bucket"
          value={step.dose}
          error={errorOf('dose')}
          onChange={(event) => put({ dose: event.target.value })}
        />
      ) : null}
      <SelectField
        label="Case"
        value={step.kitCase ?? ''}
        onChange={(event) =>
          put({ kitCase: event.target.value === '' ? null : (event.target.value as 'exterior' | 'interior') })
        }
      >
        <option value="">none</option>
        {stepCases.map((one) => (
          <option key={one} value={one}>
            {stepCaseNames[one]}
          </option>
        ))}
      </SelectField>
      <SelectField
        label="Towel"
        value={step.towel?.use ?? ''}
        onChange={(event) => towel(event.target.value as TowelUse | '', step.towel?.color ?? '')}
      >
        <option value="">none</option>
        {towelUses.map((use) => (
          <option key={use} value={use}>
            {towelUseNames[use]}
          </option>
        ))}
      </SelectField>
      {step.towel ? (
        <TextField
          label="Towel’s color"
          hint="One color, one use in the whole house."
          value={step.towel.color}
          error={errorOf('towel.color')}
          onChange={(event) => towel(step.towel?.use ?? '', event.target.value)}
        />
      ) : null}
      <TextField
        className="wide"
        label="Care"
        hint="The usual caution; the safety data sheet wins."
        value={step.caution}
        error={errorOf('caution')}
        onChange={(event) => put({ caution: event.target.value })}
      />
      <CheckField
        label="Ticked by itself: “done up to here” leaves it open, Done asks for it"
        checked={step.isAlone}
        onChange={(event) => put({ isAlone: event.target.checked })}
      />
    </div>
  );
}
