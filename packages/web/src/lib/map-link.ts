export interface Place {
  address: string;
  lat: number | null;
  lng: number | null;
}

/** Opens the phone's own map where it takes geo links, else the public OpenStreetMap. */
export function mapLink({ address, lat, lng }: Place): string {
  const hasPoint = lat !== null && lng !== null;
  if (/android/i.test(navigator.userAgent)) {
    return hasPoint ? `geo:${lat},${lng}?q=${lat},${lng}` : `geo:0,0?q=${encodeURIComponent(address)}`;
  }
  return hasPoint
    ? `https://www.openstreetmap.org/?mlat=${lat}&mlon=${lng}#map=17/${lat}/${lng}`
    : `https://www.openstreetmap.org/search?query=${encodeURIComponent(address)}`;
}
