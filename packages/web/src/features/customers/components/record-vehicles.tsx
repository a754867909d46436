import { sizeClassNames } from '@driprail/shared/contracts/fields';
import type { VehicleDto } from '@driprail/shared/contracts/customers-record.contract';
import { bodyOf } from '@driprail/shared/domain/walk-round/body';
import { wheelFinishNames } from '@driprail/shared/domain/vehicle/wheel-finish';
import { Empty } from '../../../components/states.tsx';
import sides from './vehicle-sides.svg?url&no-inline';

/** A customer's vehicles in outline, with what a crew must know of paint, wheels and seats. */
export function RecordVehicles({ vehicles }: { vehicles: VehicleDto[] }) {
  if (vehicles.length === 0) return <Empty>No vehicles on record.</Empty>;
  return (
    <ul className="cu-cars">
      {vehicles.map((vehicle) => (
        <li key={vehicle.id}>
          <svg className="cu-side" viewBox="0 -6 338 112" aria-hidden>
            <use href={`${sides}#side-${bodyOf(vehicle.sizeClass, vehicle.label)}`} />
          </svg>
          <b dir="auto">{[vehicle.label, vehicle.color].filter(Boolean).join(', ')}</b>
          <span>
            {sizeClassNames[vehicle.sizeClass]} class{vehicle.plate ? `, plate ${inOneLine(vehicle.plate)}` : ''}
          </span>
          {vehicle.vin ? <span>VIN {vehicle.vin}</span> : null}
          <span>Wheels: {wheelFinishNames[vehicle.wheelFinish].toLowerCase()}</span>
          {vehicle.isCoated ? <span className="is-note">Ceramic coating</span> : null}
          {[vehicle.paint, vehicle.interior, vehicle.notes, vehicle.mustKnow].filter(Boolean).map((note) => (
            <span key={note} className="is-note" dir="auto">
              {note}
            </span>
          ))}
        </li>
      ))}
    </ul>
  );
}

/** A plate is read in one piece. */
function inOneLine(plate: string): string {
  return plate.replace(/ /g, '\u00a0');
}
