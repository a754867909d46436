import type { SizeClass } from '@driprail/shared/contracts/fields';

/** All names are invented; together they are meant to name nobody and no business. */
export const businesses = [
  { name: 'Eastgate Clinic', area: 'Cold Harbor', vehicles: 4 },
  { name: 'Harbor Office', area: 'Old Slip', vehicles: 3 },
  { name: 'Saltpan Joinery', area: 'Saltpan Lane', vehicles: 3 },
  { name: 'Larch Hill Vets', area: 'Larch Hill', vehicles: 3 },
  { name: 'Mudlark Bakery', area: 'Quay Flats', vehicles: 4 },
  { name: 'Sluice Road School', area: 'Mill Reach', vehicles: 5 },
  { name: 'Sorrel Care Home', area: 'Fennel Court', vehicles: 3 },
  { name: 'Beacon Loop Ferries', area: 'Cold Harbor', vehicles: 3 },
  { name: 'Capstan Cab Co-op', area: 'Old Slip', vehicles: 6 },
  { name: 'Lantern Steps Inn', area: 'Harbor Row', vehicles: 2 },
  { name: 'Grist Lane Plumbing', area: 'Mill Reach', vehicles: 4 },
  { name: 'Shingle Surveyors', area: 'Cold Harbor', vehicles: 3 },
] as const;

export const lastNames = [
  ...[
    'Achterberg',
    'Adeyemi',
    'Aldous',
    'Amberley',
    'Barrow',
    'Bexley',
    'Bramwell',
    'Castellan',
    'Corvane',
    'Delacroix',
  ],
  ...['Draycott', 'Eldermere', 'Esker', 'Farrand', 'Ferrante', 'Galloway', 'Garrick', 'Halloran', 'Hartnoll', 'Ibarra'],
  ...['Iversen', 'Jessop', 'Kessler', 'Kittredge', 'Lindqvist', 'Lorimer', 'Marlowe', 'Mbele-Rose', 'Merrow', 'Moreau'],
  ...[
    'Nakagawa',
    'Nettles',
    'Oakhanger',
    'Oyelaran',
    'Pellew',
    'Prendergast',
    'Quill',
    'Quartermain',
    'Ravenel',
    'Rutledge',
  ],
  ...['Sandoval', 'Selwick', 'Strand', 'Tamsin', 'Thackeray', 'Tremaine', 'Ullman', 'Vasquez', 'Verrall', 'Whitlock'],
  ...['Winterborne', 'Wrenfield', 'Yarrow', 'Zielinska', 'Zoutman', 'Ormsby'],
] as const;

export const firstNames = [
  ...[
    'Ines',
    'Tove',
    'Bola',
    'Marc',
    'Rhona',
    'Piet',
    'Noa',
    'Maud',
    'Sten',
    'Ada',
    'Corin',
    'Delphine',
    'Emeka',
    'Fay',
  ],
  ...[
    'Gideon',
    'Hana',
    'Isolde',
    'Jarek',
    'Kezia',
    'Lowell',
    'Mireille',
    'Nils',
    'Odette',
    'Pascal',
    'Quentin',
    'Rosalind',
  ],
  ...['Soren', 'Tamar', 'Ulla', 'Viggo', 'Willa', 'Yusra', 'Zora', 'Anselm', 'Bettina', 'Cosmo', 'Dagny', 'Elspeth'],
  ...['Florian', 'Greta', 'Hugo'],
] as const;

interface VehicleKind {
  label: string;
  sizeClass: SizeClass;
}

const kind = (label: string, sizeClass: SizeClass): VehicleKind => ({ label, sizeClass });

export const vehicleKinds: Record<'household' | 'fleet', VehicleKind[]> = {
  household: [
    kind('hatchback', 'sedan'),
    kind('sedan', 'sedan'),
    kind('sedan', 'sedan'),
    kind('wagon', 'sedan'),
    kind('coupe', 'coupe'),
    kind('convertible', 'coupe'),
    kind('small SUV', 'small_suv'),
    kind('small SUV', 'small_suv'),
    kind('crossover', 'small_suv'),
    kind('SUV', 'large_suv'),
    kind('pickup', 'large_suv'),
    kind('pickup', 'large_suv'),
    kind('minivan', 'van'),
  ],
  fleet: [kind('cargo van', 'van'), kind('cargo van', 'van'), kind('hatchback', 'sedan'), kind('pickup', 'large_suv')],
};

export const colors = {
  household: ['silver', 'black', 'gray', 'white', 'blue', 'dark red', 'green', 'yellow', 'brown', 'pearl', 'navy'],
  fleet: ['white', 'white', 'gray', 'blue'],
} as const;

/** What crews are told about getting in, and what customers wish. */
export const wayIn = {
  households: [
    'Dog in the yard, shut the gate.',
    'Spigot left of the porch.',
    'Park on the street, the driveway is steep.',
    'Ring, do not knock: a baby sleeps.',
    'Key in the lock box by the side door.',
    'Outlet is behind the planter.',
    'Narrow lane, come in from the north end.',
    'Storm drain by the gate: keep wash water on the grass.',
    'Garage is open from 7, low roof.',
    'Neighbor shares the driveway, leave room.',
  ],
  companies: [
    'Sign in at the front desk.',
    'Back lot, bays 3 to 6.',
    'Loading dock side, keys at the counter.',
    'Lower deck, clearance 6 ft 8.',
    'Gate opens at 7:30.',
  ],
  wishes: [
    'No scent inside, please.',
    'Texts rather than calls.',
    'Likes the same crew each time.',
    'Pays by card at the car.',
    'Away every other week.',
  ],
  vehicles: [
    'Soft clear coat.',
    'Thin paint on the hood edge.',
    'Child seat stays in.',
    'Coated: no wax.',
    'Roof box on.',
  ],
};
