import type { CheckStep } from '@driprail/shared/domain/job-work/step';

/** A step before it has its place on a list; common practice, no source. Products are named by what they do. */
export type StepWords = Omit<CheckStep, 'id'>;

const bare: Omit<StepWords, 'stage' | 'words'> = {
  ...{ product: '', ratio: '', pour: null, dose: '', kitCase: null, towel: null, caution: '', isAlone: false },
};
const step = (stage: StepWords['stage'], words: string, more: Partial<StepWords> = {}): StepWords => ({
  ...bare,
  ...{ stage, words, ...more },
});
const bottle = (product: string, ratio: string, kitCase: 'exterior' | 'interior'): Partial<StepWords> => ({
  ...{ product, ratio, kitCase, pour: 'bottle' },
});
const dose = (product: string, ratio: string, amount: string): Partial<StepWords> => ({
  ...{ product, ratio, dose: amount, kitCase: 'exterior', pour: 'dose' },
});
const towel = (use: NonNullable<CheckStep['towel']>['use'], color: string): Partial<StepWords> => ({
  towel: { use, color },
});

const wheelTowel = towel('wheels', 'Black');
const paintTowel = towel('paint', 'Blue');
const glassTowel = towel('glass', 'Green');
const insideTowel = towel('interior', 'Gray');

const wheels = [
  step('wheels', 'Rinse wheels and wells', { caution: 'Cool to the touch first; never on hot brakes.' }),
  step('wheels', 'Wheels and tires with the wheel brush', {
    ...{ ...bottle('Wheel cleaner, not acid', '4:1', 'exterior'), ...wheelTowel },
    caution: 'Gloves and glasses. One wheel at a time, never left to dry.',
  }),
];
const wash = [
  step('wash', 'Rinse from the roof down'),
  step('wash', 'Foam, wait, rinse', dose('Foam', '10:1', '3 oz in the foam lance')),
  step(
    'wash',
    'Two buckets, roof to sill, a clean mitt below the trim',
    dose('Shampoo', '128:1', '4 oz in a 4 gallon bucket'),
  ),
  step('wash', 'Dry, door jambs and drip rails', paintTowel),
];
const outsideGlass = step('glass', 'Glass outside', {
  ...bottle('Glass cleaner', 'straight', 'exterior'),
  ...glassTowel,
});
const insideGlass = step('glass', 'Glass inside', {
  ...bottle('Glass cleaner', 'straight', 'exterior'),
  ...glassTowel,
});
const tires = step('protect', 'Dress the tires, wipe off what is wet', {
  ...bottle('Tire dressing', 'straight', 'exterior'),
  ...wheelTowel,
  caution: 'Never on the tread or the brakes.',
});
const lastLook = step('last_look', 'Walk round once more with a clean towel', paintTowel);
const vacuum = [
  step('inside_dry', 'Trash out, mats out, belongings into a bag'),
  step('inside_dry', 'Blow out and vacuum, headliner down to carpet'),
];
const dash = step('inside_wet', 'Dash, console and doors, top down', {
  ...bottle('Interior cleaner', '10:1', 'interior'),
  ...insideTowel,
  caution: 'On the towel, not on screens or switches.',
});
const underLight = step('correct', 'Check each panel under the light', paintTowel);
const panelWipe = step('correct', 'Wipe the panels down', {
  ...bottle('Panel wipe', 'straight', 'exterior'),
  ...paintTowel,
  caution: 'Flammable: air around, no flame, lid shut.',
});
const measured = step('correct', 'Measure the paint on every panel and write it down', {
  isAlone: true,
  caution: 'Thin paint or a bare edge: stop and call the shop.',
});
const clay = [
  step('decontaminate', 'Iron off, rinse well', {
    ...bottle('Iron remover', 'straight', 'exterior'),
    caution: 'Gloves. Out of the sun; never with bleach or acid near.',
  }),
  step('decontaminate', 'Tar off, spot by spot', { ...bottle('Tar remover', 'straight', 'exterior'), ...paintTowel }),
  step('decontaminate', 'Clay with lube until the paint is smooth', {
    ...bottle('Clay lube', '10:1', 'exterior'),
    caution: 'A dropped clay bar is thrown away.',
  }),
];

/** The steps of each service on the demo's menu, in order of work. */
export const checklistSteps: Record<string, { asksNote?: true; steps: StepWords[] }> = {
  'Maintenance wash': { steps: [...wheels, ...wash, outsideGlass, tires, lastLook] },
  'Wash and wax': {
    steps: [
      ...wheels,
      ...wash,
      outsideGlass,
      step('protect', 'A thin coat of wax, panel by panel', {
        ...bottle('Wax', 'straight', 'exterior'),
        ...paintTowel,
      }),
      tires,
      lastLook,
    ],
  },
  'Inside and out': { steps: [...wheels, ...wash, ...vacuum, dash, outsideGlass, insideGlass, tires, lastLook] },
  'Full interior': {
    asksNote: true,
    steps: [
      ...vacuum,
      step('inside_wet', 'Test the cleaner on a hidden spot', { isAlone: true }),
      step('inside_wet', 'Seats: spray, brush, extract', {
        ...bottle('Fabric cleaner', '10:1', 'interior'),
        caution: 'Heated seats and airbags: little water.',
      }),
      step('inside_wet', 'Carpets and mats: spray, brush, extract', bottle('Fabric cleaner', '10:1', 'interior')),
      dash,
      insideGlass,
      step('last_look', 'Seats dry to the hand, mats back'),
    ],
  },
  'Clay lube decontamination': { steps: [...wheels, ...wash, ...clay, lastLook] },
  'One-step polish': {
    steps: [
      ...wash,
      ...clay,
      measured,
      step('correct', 'Tape trim and edges'),
      step('correct', 'One pass with the soft pad, section by section', {
        ...bottle('One-step polish', 'straight', 'exterior'),
        caution: 'Keep the pad moving; feel the panel’s heat.',
      }),
      panelWipe,
      underLight,
      lastLook,
    ],
  },
  'Two-step polish': {
    asksNote: true,
    steps: [
      ...wash,
      ...clay,
      measured,
      step('correct', 'Tape trim and edges'),
      step('correct', 'Cut with the firm pad, section by section', {
        ...bottle('Cutting compound', 'straight', 'exterior'),
        caution: 'Keep the pad moving; feel the panel’s heat.',
      }),
      step('correct', 'Finish with the soft pad', bottle('Finishing polish', 'straight', 'exterior')),
      panelWipe,
      underLight,
      lastLook,
    ],
  },
  'Ceramic coating, one layer': {
    asksNote: true,
    steps: [
      ...wash,
      ...clay,
      measured,
      panelWipe,
      underLight,
      step('protect', 'Panel heat and shade are as the coating’s sheet asks', { isAlone: true }),
      step('protect', 'One layer, two feet square at a time, level it', {
        ...bottle('Ceramic coating', 'straight', 'exterior'),
        caution: 'Gloves and air around; cloths used with it are never used again.',
      }),
      step('protect', 'Tell the customer: dry for twelve hours, no wash for a week', { isAlone: true }),
    ],
  },
  'Wheels-off detail': {
    steps: [
      step('wheels', 'Level ground, brake on, wheels chocked, on stands', {
        isAlone: true,
        caution: 'Nobody reaches under a car that only a jack holds.',
      }),
      ...wheels,
      step('wheels', 'Barrels and wells', { ...bottle('All-purpose cleaner', '10:1', 'exterior'), ...wheelTowel }),
      step('protect', 'Seal barrels and faces', { ...bottle('Wheel sealant', 'straight', 'exterior'), ...wheelTowel }),
      step('protect', 'Nuts by hand, then to the car’s torque in a star', { isAlone: true }),
    ],
  },
  'Headlight restoration': {
    steps: [
      step('correct', 'Tape the paint round the lamps'),
      step('correct', 'Sand wet, coarse to fine'),
      step('correct', 'Polish clear', bottle('Plastic polish', 'straight', 'exterior')),
      step('protect', 'Seal the lamps', { ...bottle('Lens sealant', 'straight', 'exterior'), ...paintTowel }),
    ],
  },
  'Leather care': {
    steps: [
      step('inside_wet', 'Clean the leather, soft brush', {
        ...bottle('Leather cleaner', 'straight', 'interior'),
        ...insideTowel,
        caution: 'Vents in the seat: on the brush, never sprayed.',
      }),
      step('protect', 'Feed the leather, wipe off what stays', {
        ...bottle('Leather cream', 'straight', 'interior'),
        ...insideTowel,
      }),
    ],
  },
  'Pet hair': { steps: [step('inside_dry', 'Lift the hair with the rubber brush, seats then carpet')] },
  'Odor treatment': {
    steps: [
      step('inside_dry', 'Find the source and take it out', { isAlone: true }),
      step('inside_wet', 'Steam and clean where it was', {
        ...bottle('Enzyme cleaner', 'straight', 'interior'),
        caution: 'Steam burns: gloves, nozzle away from skin.',
      }),
      step('last_look', 'Treat, doors shut, car empty for 45 minutes', {
        isAlone: true,
        caution: 'Nobody inside meanwhile; air it after, as the data sheet says.',
      }),
    ],
  },
  'Engine bay': {
    steps: [
      step('wash', 'Engine is cold; cover intake, fuse box and battery', { isAlone: true }),
      step('wash', 'Degrease, brush, low-pressure rinse', {
        ...bottle('Degreaser', '10:1', 'exterior'),
        caution: 'Gloves and glasses. Wash water away from the drain, as the local code says.',
      }),
      step('protect', 'Dress plastics and hoses', bottle('Trim dressing', '1:1', 'exterior')),
    ],
  },
};
