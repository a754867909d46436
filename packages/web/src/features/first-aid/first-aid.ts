export interface Steps {
  key: string;
  title: string;
  steps: string[];
}

/** Common first aid, from memory; the emergency service on the phone and the product's data sheet come before it. */
export const firstAid: Steps[] = [
  {
    key: 'eyes',
    title: 'In the eyes',
    steps: [
      'Rinse with clean running water at once, lids held open, for at least 15 minutes.',
      'Take contact lenses out while rinsing, if they come easily.',
      'Call while rinsing. Take the bottle or its data sheet along.',
    ],
  },
  {
    key: 'skin',
    title: 'On the skin',
    steps: [
      'Take off soaked clothes and rinse with plenty of water for 15 minutes.',
      'Wheel cleaner or anything acid: call, also when it hurts little. Burns of some acids show late.',
    ],
  },
  {
    key: 'breath',
    title: 'Breathed in',
    steps: [
      'Bring the person into fresh air; sit them up, loosen what is tight.',
      'Trouble breathing, dizzy, or bleach met acid: call at once and keep everybody out.',
    ],
  },
  {
    key: 'swallowed',
    title: 'Swallowed',
    steps: [
      'Do not make the person vomit. Rinse the mouth.',
      'Call poison help or the emergency number with the bottle in hand, and do what they say.',
    ],
  },
  {
    key: 'heat',
    title: 'Too hot',
    steps: [
      'Confused, fainted, or hot and no longer sweating: call at once. This is an emergency.',
      'Until help is there: shade, wet clothes, fan, ice at neck and armpits.',
      'Tired, cramps, headache: stop work, shade, water in sips. Not better in 15 minutes: call.',
    ],
  },
  {
    key: 'burn',
    title: 'Burned or scalded',
    steps: [
      'Cool running water for 20 minutes. No ice, no grease.',
      'Larger than a hand, on face or hands, or blistered deep: call.',
    ],
  },
  {
    key: 'bleeding',
    title: 'Bleeding',
    steps: ['Press on it hard with a clean cloth and do not let go.', 'It soaks through or spurts: call.'],
  },
  {
    key: 'shock',
    title: 'Electric shock',
    steps: [
      'Do not touch the person before the power is off: pull the plug, stop the generator.',
      'Call. Not breathing: start chest compressions, and send for a defibrillator.',
    ],
  },
  {
    key: 'crash',
    title: 'Crash on the road',
    steps: [
      'Hazard lights, everybody off the road, call.',
      'Say whether chemicals leak. Keep sparks and smoke away. Do not move the hurt unless there is fire.',
    ],
  },
];

export const spill: Steps = {
  key: 'spill',
  title: 'Something spilled',
  steps: [
    'People away, gloves and eye cover on, no sparks near anything that burns.',
    'Stop it at the source: cap on, bottle upright, valve shut.',
    'Block the storm drain and the gutter first, then soak it up with towels or absorbent.',
    'Never let acid and bleach meet, in the bucket or on the ground.',
    'Bag it and take it along. What it is and where it goes stands on the data sheet; local rules decide.',
    'It reached a drain, a creek or a neighbor: tell the board at once, the company has to report it.',
  ],
};
