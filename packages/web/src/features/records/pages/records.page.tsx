import { useState } from 'react';
import { useInfiniteQuery } from '@tanstack/react-query';
import { auditEntities, listAudit } from '@driprail/shared/contracts/records.contract';
import type { AuditEntryDto } from '@driprail/shared/contracts/records.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../components/button.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { useFormats } from '../../../lib/format.ts';

type Entity = (typeof auditEntities)[number];

/** Who changed what and when. It is only ever added to, in the database too. */
export function RecordsPage() {
  const [entity, setEntity] = useState<Entity | ''>('');
  const audit = useInfiniteQuery({
    queryKey: ['records', entity],
    initialPageParam: 0,
    queryFn: ({ pageParam, signal }) =>
      call(
        listAudit,
        { query: { ...(entity && { entity }), ...(pageParam > 0 && { before: pageParam }), limit: 100 } },
        signal,
      ),
    getNextPageParam: (last) => last.next,
  });
  return (
    <>
      <PageHead title="Records" above="Who changed what; it is only ever added to" />
      <RailPage>
        <div className="hung p-5 max-w-[1200px]">
          <label className="flex items-center gap-3 mb-3">
            <span className="t-2">Show</span>
            <select
              className="inp !w-auto"
              value={entity}
              onChange={(event) => setEntity(event.target.value as Entity | '')}
            >
              <option value="">everything</option>
              {auditEntities.map((value) => (
                <option key={value} value={value}>
                  {wordsOf(value)}
                </option>
              ))}
            </select>
          </label>
          <Loaded query={audit} what="the records">
            {({ pages }) => {
              const entries = pages.flatMap((page) => page.entries);
              return (
                <>
                  {entries.length === 0 ? <Empty>Nothing of this kind yet.</Empty> : null}
                  <table className="grid-t stacks">
                    <tbody>
                      {entries.map((entry) => (
                        <Entry key={entry.id} entry={entry} />
                      ))}
                    </tbody>
                  </table>
                </>
              );
            }}
          </Loaded>
          {audit.hasNextPage ? (
            <Button className="mt-3" isBusy={audit.isFetchingNextPage} onClick={() => void audit.fetchNextPage()}>
              Show earlier ones
            </Button>
          ) : null}
        </div>
      </RailPage>
    </>
  );
}

function Entry({ entry }: { entry: AuditEntryDto }) {
  const format = useFormats();
  const { before, after, ...rest } = entry.details;
  return (
    <tr>
      <td className="whitespace-nowrap">
        {formatDate(dayOf(entry.at, format.zone))}, {format.clock(entry.at)}
      </td>
      <td>
        <b>{entry.by}</b>
      </td>
      <td className="whitespace-nowrap">
        {wordsOf(entry.entity)}: {entry.action}
      </td>
      <td>
        {Object.entries(rest).map(([key, value]) => (
          <Fact key={key} name={key} value={value} />
        ))}
        <Changes before={before} after={after} />
      </td>
    </tr>
  );
}

/** Only what differs, as it was and as it is. */
function Changes({ before, after }: { before: unknown; after: unknown }) {
  const was = asRecord(before);
  const is = asRecord(after);
  const changed = Object.keys(is).filter((key) => JSON.stringify(is[key]) !== JSON.stringify(was[key]));
  return changed.map((key) => (
    <span key={key} className="block">
      <span className="t-3">{wordsOf(key)}</span> {before ? <s className="t-3">{textOf(was[key])}</s> : null}{' '}
      {textOf(is[key])}
    </span>
  ));
}

function Fact({ name, value }: { name: string; value: unknown }) {
  if (value === null || value === '') return null;
  return (
    <span className="mr-4 inline-block">
      <span className="t-3">{wordsOf(name)}</span> {textOf(value)}
    </span>
  );
}

function asRecord(value: unknown): Record<string, unknown> {
  return typeof value === 'object' && value !== null ? (value as Record<string, unknown>) : {};
}

function textOf(value: unknown): string {
  if (value === undefined || value === null) return 'nothing';
  return typeof value === 'string' ? value : JSON.stringify(value);
}

/** "pay_week" and "startsOn" as words. */
function wordsOf(name: string): string {
  return name
    .replace(/_/g, ' ')
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase();
}
