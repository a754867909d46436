import { Link } from 'react-router';
import { paths } from '../../../app/paths.ts';
import { Compare } from './compare.tsx';
import type { ShownCar } from './shown-walk.ts';
import { WalkRecord } from './walk-record.tsx';

/** A finished walk-round before work starts: it may still be changed. */
export function Finished({ car, onAnew }: { car: ShownCar; onAnew: () => void }) {
  return (
    <>
      <WalkRecord car={car} startReason="" />
      <h2 className="sec mt-3">Photos</h2>
      <Compare photos={car.photos} />
      <footer className="ph-act">
        <Link className="ph-main" to={paths.runSheet}>
          Run sheet
        </Link>
        <div className="below">
          <button type="button" className="btn" onClick={onAnew}>
            Change it
          </button>
        </div>
      </footer>
    </>
  );
}
