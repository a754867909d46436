import type { PhotoView } from '@driprail/shared/domain/walk-round/views';
import { photoViewNames, photoViews } from '@driprail/shared/domain/walk-round/views';
import { PhotoTile } from './photo-tile.tsx';
import type { ShownPhoto } from './shown-walk.ts';

/** Before and after of each view, side by side; the last photo of a view stands for it, further ones follow. */
export function Compare({ photos }: { photos: ShownPhoto[] }) {
  if (photos.length === 0) return <p className="empty">No photos.</p>;
  const of = (view: PhotoView, moment: ShownPhoto['moment']) =>
    photos.filter((photo) => photo.view === view && photo.moment === moment);
  const looks = photos.filter(({ moment }) => moment === 'second_look');
  return (
    <>
      <div className="wr-compare">
        <p className="t-2">Before</p>
        <p className="t-2">After</p>
        {photoViews.flatMap((view) => {
          const [before, after] = [of(view, 'before'), of(view, 'after')];
          const rows = Math.max(before.length, after.length);
          return Array.from({ length: rows }, (_, row) => [
            <Side key={`${view}${row}b`} photo={before[row]} view={view} />,
            <Side key={`${view}${row}a`} photo={after[row]} view={view} />,
          ]).flat();
        })}
      </div>
      {looks.length > 0 ? (
        <>
          <h3 className="sec mt-3">Second look</h3>
          <div className="wr-photos">
            {looks.map((photo) => (
              <PhotoTile key={photo.id} photo={photo} />
            ))}
          </div>
        </>
      ) : null}
    </>
  );
}

function Side({ photo, view }: { photo: ShownPhoto | undefined; view: PhotoView }) {
  if (photo) return <PhotoTile photo={photo} />;
  return <p className="wr-none">No {photoViewNames[view].toLowerCase()}</p>;
}
