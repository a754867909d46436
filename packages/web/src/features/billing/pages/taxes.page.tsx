import { useState } from 'react';
import { useAbility } from '@casl/react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { taxClassNames } from '@driprail/shared/domain/billing/tax-rates';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';
import { taxRatesQuery } from '../api/taxes.queries.ts';
import { TaxForm } from '../components/tax-form.tsx';
import type { TaxStart } from '../components/tax-form.tsx';
import { taxGroups } from '../components/tax-groups.ts';
import '../components/bill-panel.css';
import './taxes.css';

const standingNames = { past: 'was', now: 'in force', ahead: 'to come' } as const;

/** Sales taxes by name and place, each with its rates by day. */
export function TaxesPage() {
  const { zone } = useFormats();
  const canEdit = useAbility<AppAbility>().can('update', 'Settings');
  const today = dayOf(serverNow().toISOString(), zone);
  const taxes = useQuery(taxRatesQuery);
  const [start, setStart] = useState<TaxStart | null>(null);
  const fresh: TaxStart = { name: '', place: '', taxClass: 'standard', percent: '', startsOn: today };
  return (
    <>
      <PageHead
        title="Sales taxes"
        above={
          <>
            <Link to={paths.settings} aria-label="Back to settings">
              <Icon name="left" />
            </Link>
            Settings, what stands on invoices
          </>
        }
        actions={
          canEdit ? (
            <Button look="main" onClick={() => setStart(fresh)}>
              <Icon name="plus" /> Add a tax
            </Button>
          ) : null
        }
      />
      <RailPage>
        <div className="hung tx">
          <p className="caution">
            <b>Caution.</b> Which services are taxed, and how much, differs by place and law: enter what your tax office
            tells you.
          </p>
          <Loaded query={taxes} what="the taxes">
            {({ taxRates }) =>
              taxRates.length === 0 ? (
                <Empty>No tax was entered, so invoices carry none.</Empty>
              ) : (
                taxGroups(taxRates, today).map((group) => (
                  <section key={group.key} aria-label={`${group.name}, ${group.place || 'everywhere'}`}>
                    <h2 className="sec">
                      {group.name}, {group.place || 'everywhere'}
                      <span>{taxClassNames[group.taxClass].toLowerCase()}</span>
                      {canEdit ? (
                        <button
                          type="button"
                          className="link"
                          onClick={() => setStart({ ...group, percent: '', startsOn: today })}
                        >
                          New rate
                        </button>
                      ) : null}
                    </h2>
                    <ul>
                      {group.rates.map((rate) => (
                        <li key={rate.id} className={`is-${rate.standing}`}>
                          <b>{Number(rate.percent) === 0 ? 'Ended' : `${rate.percent}%`}</b>
                          <span>from {formatDate(rate.startsOn)}</span>
                          <span>{standingNames[rate.standing]}</span>
                          <span className="t-2">{rate.setBy ? `entered by ${rate.setBy}` : ''}</span>
                        </li>
                      ))}
                    </ul>
                  </section>
                ))
              )
            }
          </Loaded>
        </div>
      </RailPage>
      {start ? (
        <Sheet title={start.name || 'A tax'} onClose={() => setStart(null)} width={560}>
          <TaxForm start={pick(start)} onDone={() => setStart(null)} />
        </Sheet>
      ) : null}
    </>
  );
}

/** Only what is sent. */
function pick({ name, place, taxClass, percent, startsOn }: TaxStart): TaxStart {
  return { name, place, taxClass, percent, startsOn };
}
