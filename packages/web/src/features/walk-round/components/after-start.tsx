import { useState } from 'react';
import { Picks } from '../../../components/picks.tsx';
import type { useWalkPress } from '../api/use-walk-press.ts';
import { useTaking } from '../photo/use-taking.ts';
import { Compare } from './compare.tsx';
import { MarkSheet, newMark } from './mark-sheet.tsx';
import { CameraButton, PhotoPart } from './photo-part.tsx';
import { SecondLook } from './second-look.tsx';
import type { ShownCar } from './shown-walk.ts';
import { WalkRecord } from './walk-record.tsx';

const pages = ['After photos', 'Before and after', 'Walk-round'] as const;

/** Once work began the walk-round stands; photos of the result, a second look and dated marks are added. */
export function AfterStart({
  car,
  startReason,
  pressing,
}: {
  car: ShownCar;
  startReason: string;
  pressing: ReturnType<typeof useWalkPress>;
}) {
  const taking = useTaking(pressing, car.vehicleId);
  const [page, setPage] = useState<(typeof pages)[number]>('After photos');
  const [isMarking, setMarking] = useState(false);
  const [fault, setFault] = useState('');
  const add = (facts: Parameters<typeof pressing.add>[0]) => {
    pressing
      .add(facts)
      .then(() => setFault(''))
      .catch(() => setFault('This phone is full, so that is not kept. Make room and press again.'));
  };
  const isLookDue = car.walkRound?.isTooDirty === true && car.walkRound.secondLook === null;
  return (
    <>
      {isLookDue ? (
        <SecondLook
          taking={taking}
          onAnswer={(outcome) => add({ kind: 'second_look', vehicleId: car.vehicleId, outcome, note: '' })}
        />
      ) : null}
      {fault ? (
        <p className="tape my-2" role="alert">
          <b>{fault}</b>
        </p>
      ) : null}
      <Picks options={pages} value={page} onPick={setPage} className="grid grid-cols-3 gap-2 my-2 wr-pages" />
      {page === 'After photos' ? (
        <PhotoPart car={car} moment="after" taking={taking}>
          {({ view, onFile }) => (
            <footer className="ph-act">
              <CameraButton view={view} isBusy={taking.isBusy} onFile={onFile} />
            </footer>
          )}
        </PhotoPart>
      ) : null}
      {page === 'Before and after' ? <Compare photos={car.photos} /> : null}
      {page === 'Walk-round' ? (
        <>
          <WalkRecord car={car} startReason={startReason} />
          <footer className="ph-act">
            <p className="t-2 mb-2">Work has begun, so this stays as it is. What you see now is added with its time.</p>
            <button type="button" className="ph-main" onClick={() => setMarking(true)}>
              Add a mark
            </button>
          </footer>
        </>
      ) : null}
      {isMarking ? (
        <MarkSheet
          mark={newMark(null)}
          isKnown={false}
          onClose={() => setMarking(false)}
          onRemove={() => setMarking(false)}
          onSave={(mark) => {
            setMarking(false);
            add({ kind: 'mark', vehicleId: car.vehicleId, mark });
          }}
        />
      ) : null}
    </>
  );
}
