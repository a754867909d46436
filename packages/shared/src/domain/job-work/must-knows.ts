/** What a crew has to know before it touches the car, in the order in which it is read. */
export const mustKnowCodes = [
  'ring_first',
  'dog',
  'shut_gate',
  'key',
  'no_scent',
  'coated',
  'creek',
  'customer_note',
  'address_note',
  'vehicle_note',
] as const;
export type MustKnowCode = (typeof mustKnowCodes)[number];

export interface MustKnow {
  code: MustKnowCode;
  /** Names the facts: a confirmation holds while they stay the same. */
  key: string;
  words: string;
}

export interface MustKnowFacts {
  isScentFree: boolean;
  ringsFirst: boolean;
  hasDog: boolean;
  shutsGate: boolean;
  drainsToCreek: boolean;
  takesKey: boolean;
  /** Where the key goes back; null while the crew may not see it yet. */
  keyGoesBack: string | null;
  customerNote: string;
  addressNote: string;
  vehicles: { id: string; name: string; isCoated: boolean; note: string }[];
}

/** The must-knows of a visit, from what is kept on its customer, address and vehicles. */
export function mustKnowsOf(facts: MustKnowFacts): MustKnow[] {
  const known: (MustKnow | null)[] = [
    when(facts.ringsFirst, 'ring_first', 'Ring first, before anything is unloaded.'),
    when(facts.hasDog, 'dog', 'A dog is here. Ask for the dog to be kept inside.'),
    when(facts.shutsGate, 'shut_gate', 'Shut the gate each time.'),
    when(facts.takesKey, 'key', keyWords(facts.keyGoesBack)),
    when(facts.isScentFree, 'no_scent', 'No scent: nothing perfumed, no air freshener.'),
    ...facts.vehicles.map((vehicle) =>
      when(
        vehicle.isCoated,
        'coated',
        `${vehicle.name || 'The car'} has a ceramic coating: no strong products, no clay, no polish unless ordered.`,
        vehicle.id,
      ),
    ),
    when(
      facts.drainsToCreek,
      'creek',
      'The drain here leads to a creek: keep wash water out of it, as the local code says.',
    ),
    when(facts.customerNote !== '', 'customer_note', facts.customerNote),
    when(facts.addressNote !== '', 'address_note', facts.addressNote),
    ...facts.vehicles.map((vehicle) =>
      when(
        vehicle.note !== '',
        'vehicle_note',
        vehicle.name ? `${vehicle.name}: ${vehicle.note}` : vehicle.note,
        vehicle.id,
      ),
    ),
  ];
  return known.filter((one) => one !== null);
}

function keyWords(goesBack: string | null): string {
  if (goesBack === null) return 'The key is taken here; where it goes back shows on the day.';
  return goesBack === ''
    ? 'The key is taken here. Ask where it goes back.'
    : `The key is taken here. It goes back: ${goesBack}.`;
}

/** Free text is named by its words, so that a changed note is read again; the key's place may come later. */
function when(isTrue: boolean, code: MustKnowCode, words: string, about = ''): MustKnow | null {
  if (!isTrue) return null;
  const isNote = code.endsWith('_note');
  return { code, key: [code, about, isNote ? words : ''].filter(Boolean).join(':').slice(0, 200), words };
}

/** The must-knows that nobody has confirmed yet. */
export function unconfirmed(mustKnows: readonly MustKnow[], confirmedKeys: readonly string[]): MustKnow[] {
  return mustKnows.filter((one) => !confirmedKeys.includes(one.key));
}
