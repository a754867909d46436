import type { PhotoView } from '@driprail/shared/domain/walk-round/views';
import { photoViewNames } from '@driprail/shared/domain/walk-round/views';
import { Mark } from '../../../components/icon.tsx';

/** The views that are asked for: which are taken, and which is next. */
export function ViewChips({
  views,
  taken,
  next,
  onPick,
}: {
  views: readonly PhotoView[];
  taken: readonly PhotoView[];
  next: PhotoView;
  onPick: (view: PhotoView) => void;
}) {
  const got = views.filter((view) => taken.includes(view)).length;
  return (
    <div className="wr-views" role="group" aria-label={`Views, ${got} of ${views.length} taken`}>
      {views.map((view) => (
        <button
          key={view}
          type="button"
          className={`${taken.includes(view) ? 'is-got' : ''}${view === next ? ' is-next' : ''}`}
          aria-pressed={view === next}
          onClick={() => onPick(view)}
        >
          {photoViewNames[view]}
          {taken.includes(view) ? (
            <>
              <Mark name="m-done" />
              <span className="sr">, taken</span>
            </>
          ) : null}
        </button>
      ))}
    </div>
  );
}
