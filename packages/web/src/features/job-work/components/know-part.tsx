import { useState } from 'react';
import { useNavigate } from 'react-router';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { useFormats } from '../../../lib/format.ts';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressWork } from '../api/work.queries.ts';
import { KeyRow } from './key-row.tsx';
import { PressFault } from './press-fault.tsx';
import type { WorkView } from './work-view.ts';

/** What to know before the car is touched; each is read and ticked, then all are confirmed with one press. */
export function KnowPart({ view, at, day }: { view: WorkView; at: AtVisit; day: string }) {
  const format = useFormats();
  const navigate = useNavigate();
  const press = usePressWork(at);
  const [read, setRead] = useState<string[]>([]);
  const { open, state, work } = view;
  const isAll = open.every((one) => read.includes(one.key));
  const toggle = (key: string) => setRead(read.includes(key) ? read.filter((one) => one !== key) : [...read, key]);
  const confirm = () =>
    press.mutate(
      { kind: 'confirm', keys: open.map((one) => one.key) },
      { onSuccess: () => void navigate(paths.runSheetDay(day)) },
    );
  return (
    <section aria-label="Must-knows">
      <p className="wk-lead">
        {work.mustKnows.length === 0 ? (
          <>
            <b>Nothing special here.</b> Gate code and notes stand on the run sheet.
          </>
        ) : open.length === 0 ? (
          <>
            <b>Confirmed</b>
            {state.confirmed ? ` by ${state.confirmed.by}, ${format.clock(state.confirmed.at)}.` : '.'}
          </>
        ) : (
          <>
            <b>Read each one.</b> Start work comes after.
          </>
        )}
      </p>
      <ul className="wk-list">
        {work.mustKnows.map((one) => {
          const isOpen = open.some((other) => other.key === one.key);
          const isTicked = !isOpen || read.includes(one.key);
          return (
            <li key={one.key}>
              <button
                type="button"
                className="wk-step"
                role="checkbox"
                aria-checked={isTicked}
                disabled={!isOpen}
                onClick={() => toggle(one.key)}
              >
                <i aria-hidden>{isTicked ? <Icon name="check" /> : null}</i>
                <span className="w">{one.words}</span>
              </button>
            </li>
          );
        })}
      </ul>
      <KeyRow view={view} at={at} />
      <PressFault error={press.error} />
      <footer className="ph-act">
        {open.length > 0 ? (
          <button type="button" className="ph-main" disabled={!isAll || press.isPending} onClick={confirm}>
            {isAll ? 'Confirm' : `${open.length - read.length} to read`}
          </button>
        ) : (
          <button type="button" className="ph-main" onClick={() => void navigate(paths.runSheetDay(day))}>
            To the run sheet
          </button>
        )}
      </footer>
    </section>
  );
}
