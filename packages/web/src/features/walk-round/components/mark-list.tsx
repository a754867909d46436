import type { MarkBody } from '@driprail/shared/contracts/walk-round.contract';
import { markAnswerNames, markKindNames, markSizeNames } from '@driprail/shared/domain/walk-round/marks';
import { useFormats } from '../../../lib/format.ts';

type ListedMark = MarkBody & { isAddition?: boolean; at?: string; by?: string };

/** Marks by the numbers they have on the outline. */
export function MarkList({ marks, onOpen }: { marks: readonly ListedMark[]; onOpen?: (mark: ListedMark) => void }) {
  const format = useFormats();
  if (marks.length === 0) return <p className="empty">No marks.</p>;
  return (
    <ol className="wr-marks">
      {marks.map((mark, index) => (
        <li key={mark.id}>
          <i aria-hidden className={mark.carriedFrom === null ? 'is-new' : ''}>
            {index + 1}
          </i>
          <span>
            <b>{markKindNames[mark.kind]}</b> {mark.place}
            <small>
              {markSizeNames[mark.size].split(',')[0]}
              {mark.carriedFrom
                ? `, ${mark.answer ? markAnswerNames[mark.answer].toLowerCase() : 'not asked about'}`
                : ''}
              {mark.note ? `. ${mark.note}` : ''}
              {mark.isAddition && mark.at ? `. Added after work began, ${format.clock(mark.at)}, ${mark.by ?? ''}` : ''}
            </small>
          </span>
          {onOpen && mark.carriedFrom === null ? (
            <button type="button" className="btn" aria-label={`Change mark ${index + 1}`} onClick={() => onOpen(mark)}>
              Change
            </button>
          ) : null}
        </li>
      ))}
    </ol>
  );
}
