export const parts = ['photos', 'marks', 'condition', 'customer'] as const;
export type Part = (typeof parts)[number];

const names: Record<Part, string> = { photos: 'Photos', marks: 'Marks', condition: 'Condition', customer: 'Customer' };
/** Which part a field that is lacking belongs to. */
const partOf: Record<string, Part> = {
  missingReason: 'photos',
  marks: 'marks',
  paint: 'condition',
  interior: 'condition',
  hasItems: 'condition',
  odometer: 'condition',
  mayMove: 'customer',
  initials: 'customer',
};

/** The four parts along the rail; the bead is where one is, and each says whether something is left. */
export function PartNav({
  part,
  lacking,
  onGo,
}: {
  part: Part;
  lacking: Record<string, string>;
  onGo: (part: Part) => void;
}) {
  const left = (of: Part) => Object.keys(lacking).filter((field) => partOf[field] === of).length;
  return (
    <nav aria-label="Parts of the walk-round">
      <ol className="steps wr-steps">
        <i className="rail-h" aria-hidden />
        {parts.map((of) => (
          <li key={of} className={of === part ? 'is-here' : left(of) === 0 ? 'is-past' : ''}>
            {of === part ? <i className="bead" aria-hidden /> : null}
            <button type="button" aria-current={of === part ? 'step' : undefined} onClick={() => onGo(of)}>
              {names[of]}
              <small>{left(of) === 0 ? 'done' : of === 'marks' ? 'to answer' : `${left(of)} left`}</small>
            </button>
          </li>
        ))}
      </ol>
    </nav>
  );
}
