import { photoViewNames } from '@driprail/shared/domain/walk-round/views';
import { useFormats } from '../../../lib/format.ts';
import { usePhotoSrc } from '../photo/use-photo-src.ts';
import type { ShownPhoto } from './shown-walk.ts';

/** One photo with its view, when and by whom, and whether it has left the phone. */
export function PhotoTile({ photo }: { photo: ShownPhoto }) {
  const format = useFormats();
  const src = usePhotoSrc(photo);
  const view = photoViewNames[photo.view];
  return (
    <figure className={photo.moment === 'before' ? 'wr-photo is-before' : 'wr-photo'}>
      {src ? (
        <a href={src} target="_blank" rel="noreferrer" aria-label={`${view}, large`}>
          <img src={src} alt={view} loading="lazy" />
        </a>
      ) : (
        <p className="empty">{waitWords(photo)}</p>
      )}
      <figcaption>
        {view}
        <small>
          {photo.isStored ? `${format.clock(photo.at)}, ${photo.by}` : waitWords(photo)}
          {photo.isAddition ? ', after work began' : ''}
        </small>
      </figcaption>
    </figure>
  );
}

function waitWords({ isStored, isHere, receivedBytes, bytes, by }: ShownPhoto): string {
  if (isStored) return 'Fetching';
  const percent = Math.floor((receivedBytes / bytes) * 100);
  if (isHere) return percent > 0 ? `sending, ${percent} %` : 'waiting to send';
  return `still on ${by}’s phone`;
}
