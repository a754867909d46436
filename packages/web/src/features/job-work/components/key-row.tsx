import { useState } from 'react';
import { Icon } from '../../../components/icon.tsx';
import { Picks } from '../../../components/picks.tsx';
import { useFormats } from '../../../lib/format.ts';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressWork } from '../api/work.queries.ts';
import { PressFault } from './press-fault.tsx';
import type { WorkView } from './work-view.ts';

const places = ['To the customer', 'Lockbox', 'Front desk', 'Where it lay'];

/** The customer's key: taken, with where it goes back, and handed back. Until then the desk has it on its list. */
export function KeyRow({ view, at }: { view: WorkView; at: AtVisit }) {
  const format = useFormats();
  const press = usePressWork(at);
  const [isTaking, setTaking] = useState(false);
  const { keyOut } = view.state;
  const known = view.work.keyGoesBack;
  if (keyOut)
    return (
      <div className="wk-key is-out">
        <p>
          <Icon name="key" /> <b>Key taken</b> by {keyOut.by}, {format.clock(keyOut.at)}
          {keyOut.words ? `. Goes back: ${keyOut.words}` : ''}
        </p>
        <button
          type="button"
          className="btn"
          disabled={press.isPending}
          onClick={() => press.mutate({ kind: 'key_back' })}
        >
          Key handed back
        </button>
        <PressFault error={press.error} />
      </div>
    );
  return (
    <div className="wk-key">
      {isTaking ? (
        <>
          <p>
            <b>Where does the key go back?</b>
          </p>
          <Picks
            options={known ? [known, ...places] : places}
            value={null}
            className="grid grid-cols-2 gap-2"
            onPick={(place) => {
              setTaking(false);
              press.mutate({ kind: 'key_taken', words: place });
            }}
          />
        </>
      ) : (
        <button type="button" className="btn" onClick={() => setTaking(true)}>
          <Icon name="key" /> {view.work.takesKey ? 'Take the key' : 'A key was taken'}
        </button>
      )}
      <PressFault error={press.error} />
    </div>
  );
}
