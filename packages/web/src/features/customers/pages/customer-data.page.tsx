import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router';
import type { CustomerData } from '@driprail/shared/contracts/customers-data.contract';
import { sizeClassNames } from '@driprail/shared/contracts/fields';
import { channelNames } from '@driprail/shared/domain/customer/consent';
import { drainNames, washWaterNames } from '@driprail/shared/domain/customer/place-facts';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { wheelFinishNames } from '@driprail/shared/domain/vehicle/wheel-finish';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { useFormats } from '../../../lib/format.ts';
import { customerDataFile, customerDataQuery } from '../api/data.queries.ts';
import { DataJobs } from '../components/data-jobs.tsx';
import './customer-data.css';

/** All that is kept about one customer, to read, print or hand over as a file. */
export function CustomerDataPage() {
  const { id = '' } = useParams();
  const query = useQuery(customerDataQuery(id));
  return (
    <>
      <PageHead
        title="Copy of the data"
        above={
          <Link to={paths.customer(id)} className="!w-auto !flex">
            <Icon name="left" /> Customer
          </Link>
        }
        actions={
          <>
            <Button onClick={() => window.print()}>
              <Icon name="print" /> Print
            </Button>
            <a className="btn" href={customerDataFile(id)} download="customer-data.json">
              Download as a file
            </a>
          </>
        }
      />
      <RailPage>
        <article className="hung p-5 max-w-[900px] cu-data" aria-label="Copy of the data">
          <Loaded query={query} what="the data">
            {(data) => <Copy data={data} />}
          </Loaded>
        </article>
      </RailPage>
    </>
  );
}

function Copy({ data }: { data: CustomerData }) {
  const { zone } = useFormats();
  const { customer } = data;
  return (
    <>
      <h2 className="t-hang text-[40px] leading-[40px]" dir="auto">
        {customer.name}
      </h2>
      <p className="t-2">
        What {data.company} keeps, {formatDate(dayOf(data.madeAt, zone))}
      </p>
      <Facts
        facts={[
          ['Phone', customer.phone],
          ['E-mail', customer.email],
          ['Since', formatDate(dayOf(data.since, zone))],
          ['Also recorded as', data.otherNames.join(', ')],
          ['Tags', customer.tags.join(', ')],
          ['No scent', customer.isScentFree],
          ['Ring first', customer.ringsFirst],
          ['Every crew must know', customer.mustKnow],
          ['Notes', customer.notes],
        ]}
      />
      <h3 className="sec mt-4">Consents</h3>
      <Facts
        facts={data.consents.map(({ channel, isGiven, on, how }) => [
          channelNames[channel],
          `${isGiven ? 'Yes' : 'No'}, ${formatDate(on)}, ${how}`,
        ])}
      />
      <h3 className="sec mt-4">Addresses</h3>
      {data.addresses.map((address) => (
        <Facts
          key={address.id}
          facts={[
            [
              address.label || 'Address',
              [address.line, address.area, address.city, address.postcode].filter(Boolean).join(', '),
            ],
            ['Place', address.lat === null || address.lng === null ? '' : `${address.lat}, ${address.lng}`],
            ['Gate code', address.gateCode],
            ['Access notes', address.accessNotes],
            ['Spigot', address.hasWater],
            ['Outlet', address.hasPower],
            ['Dog', address.hasDog],
            ['Shut the gate', address.shutsGate],
            ['Key is taken', address.takesKey],
            ['Key goes back', address.keyGoesBack],
            ['Drain', drainNames[address.drain]],
            ['Wash water', address.washWater ? washWaterNames[address.washWater] : ''],
            ['Permit', [address.permitNumber, address.permitUntil ?? ''].filter(Boolean).join(', until ')],
            ['Agreed to work there', [address.ownerConsentBy, address.ownerConsentOn ?? ''].filter(Boolean).join(', ')],
            ['Must-know', address.mustKnow],
            ['Not used any more', !address.isKept],
          ]}
        />
      ))}
      <h3 className="sec mt-4">Vehicles</h3>
      {data.vehicles.map((vehicle) => (
        <Facts
          key={vehicle.id}
          facts={[
            ['Vehicle', [vehicle.label, vehicle.color].filter(Boolean).join(', ')],
            ['Plate', vehicle.plate],
            ['VIN', vehicle.vin],
            ['Size class', sizeClassNames[vehicle.sizeClass]],
            ['Wheel finish', wheelFinishNames[vehicle.wheelFinish]],
            ['Ceramic coating', vehicle.isCoated],
            ['Paint', vehicle.paint],
            ['Interior', vehicle.interior],
            ['Notes', vehicle.notes],
            ['Must-know', vehicle.mustKnow],
            ['Not used any more', !vehicle.isKept],
          ]}
        />
      ))}
      <h3 className="sec mt-4">Jobs</h3>
      <DataJobs jobs={data.jobs} />
    </>
  );
}

/** What is empty or no is left out; the file has all of it. */
function Facts({ facts }: { facts: (readonly [string, string | boolean])[] }) {
  const told = facts.filter(([, value]) => value !== '' && value !== false);
  if (told.length === 0) return <p className="empty">Nothing kept.</p>;
  return (
    <dl className="cu-facts">
      {told.map(([name, value], index) => (
        <div key={index}>
          <dt>{name}</dt>
          <dd dir="auto">{value === true ? 'Yes' : value}</dd>
        </div>
      ))}
    </dl>
  );
}
