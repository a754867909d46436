import { useEffect, useRef } from 'react';
import type { ReactNode } from 'react';
import { money } from '../../../lib/format.ts';

interface Props {
  title: string;
  /** The large head of the step that is being done. */
  head: string;
  state: 'done' | 'now' | 'later';
  summary?: ReactNode;
  onChange: () => void;
  children: ReactNode;
}

/** One step on the rail: done with what was chosen, being done, or still to come. */
export function Step({ title, head, state, summary, onChange, children }: Props) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => {
    if (state !== 'now') return;
    heading.current?.focus({ preventScroll: true });
    heading.current?.scrollIntoView({ block: 'start' });
  }, [state]);
  return (
    <li aria-current={state === 'now' ? 'step' : undefined} className={`book-step is-${state}`}>
      {state === 'now' ? <i className="bead" aria-hidden /> : <i className="on" aria-hidden />}
      <h2 ref={heading} tabIndex={-1} className={state === 'now' ? 't-hang' : ''}>
        {state === 'now' ? head : title}
      </h2>
      {state === 'done' ? (
        <button type="button" className="link" onClick={onChange} aria-label={`Change ${title.toLowerCase()}`}>
          Change
        </button>
      ) : null}
      {state === 'done' && summary ? <p className="t-2">{summary}</p> : null}
      {state === 'now' ? children : null}
    </li>
  );
}

/** What it comes to so far, and the one press of this step. */
export function StepFoot({
  cents,
  label,
  isBusy = false,
  isOff = false,
}: {
  cents: number;
  label: string;
  isBusy?: boolean;
  isOff?: boolean;
}) {
  return (
    <footer className="ph-act book-act">
      <dl>
        <dt>Before tax</dt>
        <dd>{money(cents)}</dd>
      </dl>
      <button type="submit" className="ph-main" disabled={isBusy || isOff}>
        {isBusy ? 'One moment' : label}
      </button>
    </footer>
  );
}
