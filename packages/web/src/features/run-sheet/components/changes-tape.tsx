import { useQuery, useQueryClient } from '@tanstack/react-query';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { useFormats } from '../../../lib/format.ts';
import { keepCopy, readCopy } from '../../../lib/outbox/store.ts';
import { useSession } from '../../../lib/session.tsx';
import { changesSince, seenOf } from './changes.ts';
import type { SeenVisit } from './changes.ts';

/** What the board changed since this person last looked at the day; gone once it was seen, held back on the way. */
export function ChangesTape({ sheet, isQuiet }: { sheet: RunSheetDto; isQuiet: boolean }) {
  const { user } = useSession();
  const client = useQueryClient();
  const format = useFormats();
  const name = `${user.id}:seen:${sheet.day}`;
  const queryKey = ['seen', name];
  const seen = useQuery({
    queryKey,
    networkMode: 'always',
    staleTime: Infinity,
    // The first look sees everything.
    queryFn: async () => (await readCopy<SeenVisit[]>(name))?.value ?? (await look(name, sheet)),
  });
  const changes = seen.data ? changesSince(seen.data, sheet.visits, format.clock) : [];
  if (isQuiet || changes.length === 0) return null;
  return (
    <div className="tape changes" role="status">
      <p>
        <b>Since you last looked</b>
      </p>
      {changes.map((change) => (
        <p key={change.id}>
          <b>{change.who}</b>: {change.words}.
        </p>
      ))}
      <button
        type="button"
        className="btn"
        onClick={() => void look(name, sheet).then((visits) => client.setQueryData(queryKey, visits))}
      >
        Seen
      </button>
    </div>
  );
}

async function look(name: string, sheet: RunSheetDto): Promise<SeenVisit[]> {
  const visits = seenOf(sheet.visits);
  await keepCopy(name, visits);
  return visits;
}
