import { useEffect, useRef, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router';
import { listCustomers } from '@driprail/shared/contracts/customers.contract';
import { findJobs } from '@driprail/shared/contracts/jobs.contract';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Icon } from '../../components/icon.tsx';
import { call } from '../../lib/call.ts';
import { serverNow } from '../../lib/device-clock.ts';
import { useSession } from '../../lib/session.tsx';
import { paths } from '../paths.ts';

/** One box for name, plate, phone, street or job number; "/" goes to it from anywhere. */
export function Find() {
  const input = useRef<HTMLInputElement>(null);
  const [text, setText] = useState('');
  const [picked, setPicked] = useState(0);
  const navigate = useNavigate();
  const { zone } = useSession().company;
  const find = text.trim();
  const found = useQuery({
    queryKey: ['jobs', 'find', find],
    enabled: find.length >= 2,
    queryFn: async ({ signal }) => {
      const [{ jobs }, { customers }] = await Promise.all([
        call(findJobs, { query: { find } }, signal),
        call(listCustomers, { query: { find, limit: 6 } }, signal),
      ]);
      return [
        ...jobs.slice(0, 8).map((job) => ({
          key: job.id,
          label: `${job.customerName}, job ${job.number}`,
          note: job.from ? dayOf(job.from, zone) : 'unplaced',
          to: `${paths.boardDay(job.from ? dayOf(job.from, zone) : dayOf(serverNow().toISOString(), zone))}?job=${job.id}`,
        })),
        ...customers.map((customer) => ({
          key: customer.id,
          label: customer.name,
          note: customer.phone,
          to: paths.customer(customer.id),
        })),
      ];
    },
  });
  useEffect(() => {
    const focus = (event: KeyboardEvent) => {
      const isTyping = event.target instanceof HTMLElement && event.target.closest('input, textarea, select, dialog');
      if (event.key !== '/' || isTyping) return;
      event.preventDefault();
      input.current?.focus();
    };
    document.addEventListener('keydown', focus);
    return () => document.removeEventListener('keydown', focus);
  }, []);
  const rows = find.length >= 2 ? (found.data ?? []) : [];
  const go = (to: string) => {
    setText('');
    input.current?.blur();
    void navigate(to);
  };
  return (
    <div className="find max-[900px]:!hidden" role="search">
      <Icon name="search" />
      <input
        ref={input}
        value={text}
        placeholder="Name, plate, job number"
        aria-label="Find a job or customer"
        role="combobox"
        aria-expanded={rows.length > 0}
        aria-controls="find-list"
        aria-activedescendant={rows[picked] ? `find-${rows[picked].key}` : undefined}
        onChange={(event) => {
          setText(event.target.value);
          setPicked(0);
        }}
        onKeyDown={(event) => {
          if (event.key === 'ArrowDown') setPicked((at) => Math.min(at + 1, rows.length - 1));
          else if (event.key === 'ArrowUp') setPicked((at) => Math.max(at - 1, 0));
          else if (event.key === 'Enter' && rows[picked]) go(rows[picked].to);
          else if (event.key === 'Escape') setText('');
          else return;
          event.preventDefault();
        }}
      />
      <kbd aria-hidden>/</kbd>
      {find.length >= 2 ? (
        <div className="menu left-[-1px] top-[34px] w-[340px]" id="find-list" role="listbox" aria-label="Found">
          {rows.map((row, index) => (
            <button
              key={row.key}
              id={`find-${row.key}`}
              type="button"
              role="option"
              aria-selected={index === picked}
              onClick={() => go(row.to)}
            >
              <span className="truncate">{row.label}</span>
              <span className="t-3">{row.note}</span>
            </button>
          ))}
          {found.data && rows.length === 0 ? <p className="px-2 py-1 t-2">Nothing found for “{find}”.</p> : null}
        </div>
      ) : null}
    </div>
  );
}
