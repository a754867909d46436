import { unprocessable } from '../../http/errors.ts';
import type { Geocoder } from '../../integrations/maps/index.ts';

const BY_HAND = 'Type latitude and longitude, as a map shows them for a place.';

/** @throws 422 with what to do instead */
export async function placeOf(
  geocoder: Geocoder | null,
  address: { line: string; city: string; postcode: string },
): Promise<{ lat: number; lng: number }> {
  if (!geocoder) throw unprocessable('no_map_service', `No map service is set up here. ${BY_HAND}`);
  const place = await geocoder.find(address);
  if (!place) {
    const message = `The map does not know “${address.line}”. Check street and number, or: ${BY_HAND}`;
    throw unprocessable('not_on_the_map', message, { fields: { line: message } });
  }
  return place;
}
