export interface VehicleName {
  year: number | null;
  make: string;
  model: string;
}

/** What a vehicle is called on the board and the run sheet. */
export function vehicleLabel({ year, make, model }: VehicleName): string {
  return [year ?? '', make, model].filter((part) => part !== '').join(' ');
}

/** A name typed in one piece, like "2019 hatchback": a leading year, and all else as the model. */
export function nameFromLabel(label: string): VehicleName {
  const [, year, model] = /^((?:19|20)\d\d)\s+(.+)$/.exec(label.trim()) ?? [];
  return year === undefined || model === undefined
    ? { year: null, make: '', model: label.trim() }
    : { year: Number(year), make: '', model };
}
