import { ratioText } from '@driprail/shared/domain/kit/dilution/dilution-ratio';
import { readRatio } from '@driprail/shared/domain/kit/dilution/read-ratio';
import { TextField } from '../../../components/field.tsx';

interface RatioFieldProps {
  value: string;
  error: string | undefined;
  onChange: (ratio: string) => void;
}

/** A ratio as people write it. Where it reads in two ways it asks, and nothing is guessed. */
export function RatioField({ value, error, onChange }: RatioFieldProps) {
  const read = value.trim() === '' ? null : readRatio(value);
  // A reading that itself reads in two ways is no answer.
  const readings =
    read?.kind === 'question' ? read.readings.filter(({ ratio }) => readRatio(ratioText(ratio)).kind === 'ratio') : [];
  return (
    <div>
      <TextField
        label="Ratio, water first"
        placeholder="10:1 or straight"
        value={value}
        error={read?.kind === 'unreadable' ? read.reason : read?.kind === 'question' ? read.question : error}
        onChange={(event) => onChange(event.target.value)}
        onBlur={() => {
          if (read?.kind === 'ratio') onChange(ratioText(read.ratio));
        }}
      />
      {readings.length > 0 ? (
        <div className="grid gap-1 mt-1">
          {readings.map(({ label, ratio }) => (
            <button key={label} type="button" className="link text-left" onClick={() => onChange(ratioText(ratio))}>
              {label}
            </button>
          ))}
        </div>
      ) : null}
    </div>
  );
}
