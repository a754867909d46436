import type { CustomerPhotoDto } from '@driprail/shared/contracts/customer-page.contract';
import type { PhotoView } from '@driprail/shared/domain/walk-round/views';
import { photoViewNames, photoViews } from '@driprail/shared/domain/walk-round/views';

/** Before and after of each view, side by side; a view with one of them alone takes the whole width. */
export function CustomerPhotos({ token, photos }: { token: string; photos: CustomerPhotoDto[] }) {
  const last = (view: PhotoView, moment: CustomerPhotoDto['moment']) =>
    photos.findLast((photo) => photo.view === view && photo.moment === moment);
  const pairs = photoViews.flatMap((view) => {
    const sides = [last(view, 'before'), last(view, 'after')].filter((photo) => photo !== undefined);
    return sides.length > 0 ? [{ view, sides }] : [];
  });
  return (
    <section aria-label="Photos" className="cust-photos">
      {pairs.map(({ view, sides }) => (
        <div key={view} className={sides.length === 2 ? 'pair' : ''}>
          {sides.map((photo) => {
            const words = `${photoViewNames[view]}, ${photo.moment === 'before' ? 'before' : 'after'}`;
            const address = `/api/customer-pages/${token}/photos/${photo.id}`;
            return (
              <figure key={photo.id}>
                <a href={address} target="_blank" rel="noreferrer" aria-label={`${words}, large`}>
                  <img src={address} alt={words} loading="lazy" />
                </a>
                <figcaption>{words}</figcaption>
              </figure>
            );
          })}
        </div>
      ))}
    </section>
  );
}
