export interface PostalAddress {
  line: string;
  city: string;
  postcode: string;
}

export interface MapPlace {
  /** Degrees, north and east positive (WGS 84). */
  lat: number;
  lng: number;
}

/** Where an address is. A company's own map service stands behind it, or the local stand-in. */
export interface Geocoder {
  /** @returns null for an address the service does not know */
  find(address: PostalAddress): Promise<MapPlace | null>;
}
