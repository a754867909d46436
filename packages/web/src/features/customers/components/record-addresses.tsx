import type { AddressDto } from '@driprail/shared/contracts/customers-record.contract';
import { drainNames, washWaterNames } from '@driprail/shared/domain/customer/place-facts';
import { formatDate } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Icon } from '../../../components/icon.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';
import { mapLink } from '../../../lib/map-link.ts';

/** Each address with what a crew finds there. The code itself is shown to the crew alone, on the day. */
export function RecordAddresses({ addresses }: { addresses: AddressDto[] }) {
  return (
    <ul className="cu-places">
      {addresses.map((address) => (
        <li key={address.id}>
          <b>{address.label || address.area || 'Address'}</b>{' '}
          <bdi>{[address.line, address.city, address.postcode].filter(Boolean).join(', ')}</bdi>{' '}
          <a href={mapLink({ ...address, address: `${address.line}, ${address.city}` })}>Map</a>
          {address.lat === null ? <span className="t-2"> (not placed on the map yet)</span> : null}
          <p>
            {address.gateCode ? <Fact icon="gate">Code kept</Fact> : null}
            {address.hasWater ? <Fact icon="hose">Spigot</Fact> : <Fact icon="nohose">No spigot</Fact>}
            <Fact icon="power">{address.hasPower ? 'Outlet' : 'No outlet'}</Fact>
            {address.hasDog ? <Fact icon="dog">Dog</Fact> : null}
            {address.takesKey ? <Fact icon="key">Key is taken</Fact> : null}
            <Fact icon="drop">Drain: {drainNames[address.drain].toLowerCase()}</Fact>
          </p>
          {address.washWater ? <p>Wash water: {washWaterNames[address.washWater].toLowerCase()}</p> : null}
          {address.accessNotes ? <p dir="auto">{address.accessNotes}</p> : null}
          {address.mustKnow ? <p dir="auto">{address.mustKnow}</p> : null}
          {address.ownerConsentOn ? (
            <p>
              {address.ownerConsentBy} agreed to work here on {formatDate(address.ownerConsentOn)}
            </p>
          ) : null}
          <Permit address={address} />
        </li>
      ))}
    </ul>
  );
}

function Fact({ icon, children }: { icon: string; children: React.ReactNode }) {
  return (
    <span>
      <Icon name={icon} />
      {children}
    </span>
  );
}

function Permit({ address: { permitNumber, permitUntil } }: { address: AddressDto }) {
  const { zone } = useFormats();
  if (!permitNumber && !permitUntil) return null;
  const name = permitNumber ? `Permit ${permitNumber}` : 'The permit';
  if (permitUntil && permitUntil < dayOf(serverNow().toISOString(), zone))
    return (
      <p className="tape">
        <b>{name} ended.</b> It ran until {formatDate(permitUntil)}.
      </p>
    );
  return <p>{permitUntil ? `${name}, until ${formatDate(permitUntil)}` : name}</p>;
}
