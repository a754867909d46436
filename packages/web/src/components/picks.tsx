interface Props<T> {
  options: readonly T[];
  value: T | null;
  onPick: (option: T) => void;
  nameOf?: (option: T) => string;
  className: string;
}

/** Thumb-size answers to pick from; a field beside them may say something else, and then none is pressed. */
export function Picks<T extends string | number>({ options, value, onPick, nameOf = String, className }: Props<T>) {
  return (
    <div className={className}>
      {options.map((option) => (
        <button
          key={option}
          type="button"
          className={value === option ? 'btn is-picked' : 'btn'}
          aria-pressed={value === option}
          onClick={() => onPick(option)}
        >
          {nameOf(option)}
        </button>
      ))}
    </div>
  );
}
