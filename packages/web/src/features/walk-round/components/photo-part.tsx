import { useState } from 'react';
import type { PhotoMoment, PhotoView } from '@driprail/shared/domain/walk-round/views';
import { missingViews, photoViewNames, photoViews, viewsOf } from '@driprail/shared/domain/walk-round/views';
import { Icon } from '../../../components/icon.tsx';
import type { useTaking } from '../photo/use-taking.ts';
import { PhotoButton } from './photo-button.tsx';
import { PhotoTile } from './photo-tile.tsx';
import type { ShownCar } from './shown-walk.ts';
import { TakingFaults } from './taking-faults.tsx';
import { ViewChips } from './view-chips.tsx';

/** Photos of one moment, view by view; the next missing one is proposed. What stands in the thumb's place is the caller's. */
export function PhotoPart({
  car,
  moment,
  taking,
  children,
}: {
  car: ShownCar;
  moment: PhotoMoment;
  taking: ReturnType<typeof useTaking>;
  children: (camera: { view: PhotoView; missing: PhotoView[]; onFile: (file: File) => void }) => React.ReactNode;
}) {
  const [picked, setPicked] = useState<PhotoView | null>(null);
  const photos = photoViews.flatMap((of) => car.photos.filter((photo) => photo.moment === moment && photo.view === of));
  const taken = photos.map(({ view }) => view);
  const missing = missingViews(car.photoSet, taken);
  const view = picked ?? missing[0] ?? 'extra';
  const onFile = (file: File) => {
    setPicked(null);
    void taking.take(file, view, moment);
  };
  return (
    <>
      <ViewChips views={[...viewsOf(car.photoSet), 'extra']} taken={taken} next={view} onPick={setPicked} />
      <TakingFaults faults={taking.faults} onSettle={taking.settle} />
      {photos.length > 0 ? (
        <div className="wr-photos">
          {photos.map((photo) => (
            <PhotoTile key={photo.id} photo={photo} />
          ))}
        </div>
      ) : (
        <p className="empty">No photos yet. Position and camera data stay behind on this phone.</p>
      )}
      <PhotoButton className="btn w-full mt-2" isCamera={false} isBusy={taking.isBusy} onFile={onFile}>
        Pick a picture for {photoViewNames[view].toLowerCase()}
      </PhotoButton>
      {children({ view, missing, onFile })}
    </>
  );
}

/** The camera in the thumb's place. */
export function CameraButton({
  view,
  isBusy,
  onFile,
}: {
  view: PhotoView;
  isBusy: boolean;
  onFile: (file: File) => void;
}) {
  return (
    <PhotoButton className="ph-main" isCamera isBusy={isBusy} onFile={onFile}>
      <Icon name="camera" /> {isBusy ? 'Making it small' : `Photo: ${photoViewNames[view]}`}
    </PhotoButton>
  );
}
