import { photoViewNames } from '@driprail/shared/domain/walk-round/views';
import type { TakingFault } from '../photo/use-taking.ts';

/** What went wrong with a photo, with what to do; nothing is thrown away by itself. */
export function TakingFaults({ faults, onSettle }: { faults: TakingFault[]; onSettle: (fault: TakingFault) => void }) {
  return faults.map((fault, index) => (
    <div key={index} className="tape my-2" role="alert">
      <b>{photoViewNames[fault.view]}.</b> {fault.message}{' '}
      {fault.retry ? (
        <button type="button" className="link" onClick={() => void fault.retry?.()}>
          Keep the photo
        </button>
      ) : (
        <button type="button" className="link" onClick={() => onSettle(fault)}>
          Understood
        </button>
      )}
    </div>
  ));
}
