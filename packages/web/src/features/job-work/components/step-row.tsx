import { stepCaseNames, towelUseNames } from '@driprail/shared/domain/job-work/step';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import type { PlannedStep } from '@driprail/shared/domain/job-work/work-plan';
import { Icon } from '../../../components/icon.tsx';
import { useFormats } from '../../../lib/format.ts';

interface StepRowProps {
  planned: PlannedStep;
  isDisabled: boolean;
  onPress: () => void;
}

/** One step: press it to tick, press again to take the tick back. What it needs stands below it. */
export function StepRow({ planned: { step, mark }, isDisabled, onPress }: StepRowProps) {
  const format = useFormats();
  const needs = needsOf(step);
  return (
    <li className={step.isAlone ? 'is-alone' : ''}>
      <button
        type="button"
        className={mark ? 'wk-step is-done' : 'wk-step'}
        role="checkbox"
        aria-checked={mark !== null}
        disabled={isDisabled}
        onClick={onPress}
      >
        <i aria-hidden>{mark ? <Icon name="check" /> : null}</i>
        <span className="w">
          {step.words}
          {step.isAlone ? <em>Ticked by itself</em> : null}
          {needs.map((need) => (
            <small key={need}>{need}</small>
          ))}
          {step.caution ? (
            <small className="c">
              <b>Care.</b> {step.caution}
            </small>
          ) : null}
        </span>
        <span className="r">{mark ? `${firstName(mark.by)} ${format.clock(mark.at)}` : step.ratio}</span>
      </button>
    </li>
  );
}

/** The ratio stands at the right, where a glance finds it. */
function needsOf({ product, pour, dose, kitCase, towel }: CheckStep): string[] {
  const from = pour === 'dose' ? `dose ${dose}`.trim() : pour === 'bottle' ? 'bottle' : '';
  const bottle = [product, from, kitCase ? stepCaseNames[kitCase].toLowerCase() : ''].filter(Boolean).join(', ');
  return [bottle, towel ? `${towelUseNames[towel.use]}, ${towel.color}` : ''].filter(Boolean);
}

function firstName(name: string): string {
  return name.split(' ')[0] ?? name;
}
