import { useState } from 'react';
import { unanswered } from '@driprail/shared/domain/walk-round/marks';
import { lackingIn } from '@driprail/shared/domain/walk-round/lacking';
import { missingReasons, photoViewNames } from '@driprail/shared/domain/walk-round/views';
import { Fetching } from '../../../components/states.tsx';
import { Picks } from '../../../components/picks.tsx';
import { useWalkDraft } from '../api/use-walk-draft.ts';
import type { useWalkPress } from '../api/use-walk-press.ts';
import { useTaking } from '../photo/use-taking.ts';
import { ConditionPart } from './condition-part.tsx';
import { CustomerPart } from './customer-part.tsx';
import { MarkPart } from './mark-part.tsx';
import { CameraButton, PhotoPart } from './photo-part.tsx';
import type { ShownCar } from './shown-walk.ts';
import { beginDraft, readOdometer, viewsTaken } from './walk-draft.ts';
import { PartNav, parts } from './part-nav.tsx';
import type { Part } from './part-nav.tsx';

const nextNames: Record<Part, string> = {
  photos: 'Photos',
  marks: 'Marks',
  condition: 'Condition',
  customer: 'Customer',
};

/** A walk-round that is being made, in four parts; every touch is kept on the phone. */
export function BeforeStart({
  car,
  draftName,
  pressing,
  onFinished,
}: {
  car: ShownCar;
  draftName: string;
  pressing: ReturnType<typeof useWalkPress>;
  onFinished: () => void;
}) {
  const draft = useWalkDraft(draftName, () => beginDraft(car));
  const taking = useTaking(pressing, car.vehicleId);
  const [part, setPart] = useState<Part>('photos');
  const [fault, setFault] = useState('');
  if (draft.value === null) return <Fetching what="what you began" />;
  const value = draft.value;
  const go = (to: Part) => {
    setPart(to);
    window.scrollTo(0, 0);
  };
  const next = parts[parts.indexOf(part) + 1];
  const photoViews = viewsTaken(car);
  const open = unanswered(car.lastMarks, value.marks).length;
  const odometer = readOdometer(value.odometer);
  const lacking = {
    ...(open > 0 && { marks: `Answer the marks of last time: ${open} left.` }),
    ...(odometer === undefined && { odometer: 'Give the odometer in whole numbers, or leave it empty.' }),
    ...lackingIn({ ...value, photoViews }, car.photoSet),
  };
  const [firstLacking] = Object.values(lacking);

  const finish = async () => {
    const { odometer: _typed, ...facts } = value;
    try {
      await pressing.finish({ ...facts, vehicleId: car.vehicleId, odometer: odometer ?? null, photoViews });
      draft.drop();
      onFinished();
    } catch {
      setFault('This phone is full, so the walk-round can’t be kept. Make room and press again; nothing here is lost.');
    }
  };
  const nextButton = next ? (
    <button type="button" className="ph-main" onClick={() => go(next)}>
      Next: {nextNames[next]}
    </button>
  ) : null;
  return (
    <>
      <PartNav part={part} lacking={lacking} onGo={go} />
      {part === 'photos' ? (
        <PhotoPart car={car} moment="before" taking={taking}>
          {({ view, missing, onFile }) => (
            <>
              {missing.length > 0 ? (
                <div role="group" aria-label="Why views are missing">
                  <h2 className="sec mt-3">
                    Without{' '}
                    {missing.length === 1
                      ? photoViewNames[missing[0] ?? 'extra'].toLowerCase()
                      : `${missing.length} views`}
                    <span>pick why, and go on</span>
                  </h2>
                  <Picks
                    options={missingReasons}
                    value={missingReasons.find((reason) => reason === value.missingReason) ?? null}
                    onPick={(missingReason) => draft.set({ ...value, missingReason })}
                    className="grid grid-cols-2 gap-2 my-2"
                  />
                </div>
              ) : null}
              <footer className="ph-act">
                {missing.length > 0 && value.missingReason === '' ? (
                  <CameraButton view={view} isBusy={taking.isBusy} onFile={onFile} />
                ) : (
                  nextButton
                )}
              </footer>
            </>
          )}
        </PhotoPart>
      ) : null}
      {part === 'marks' ? <MarkPart car={car} draft={value} onChange={draft.set} /> : null}
      {part === 'condition' ? <ConditionPart draft={value} onChange={draft.set} /> : null}
      {part === 'customer' ? <CustomerPart draft={value} onChange={draft.set} /> : null}
      {part === 'photos' ? null : (
        <footer className="ph-act">
          {fault ? (
            <p className="tape mb-2" role="alert">
              <b>{fault}</b>
            </p>
          ) : null}
          {next ? (
            nextButton
          ) : (
            <>
              {firstLacking ? <p className="mb-2">{firstLacking}</p> : null}
              <button
                type="button"
                className="ph-main seal"
                disabled={firstLacking !== undefined}
                onClick={() => void finish()}
              >
                Finish walk-round
              </button>
            </>
          )}
        </footer>
      )}
    </>
  );
}
