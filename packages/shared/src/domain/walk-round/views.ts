/** What a service asks to be photographed, the smallest first. */
export const photoSets = ['none', 'quick', 'full'] as const;
export type PhotoSet = (typeof photoSets)[number];
export const photoSetNames: Record<PhotoSet, string> = {
  none: 'No walk-round',
  quick: 'Quick, four views',
  full: 'Full, all views',
};

export const photoViews = [
  'front',
  'rear',
  'left',
  'right',
  'roof_hood',
  'wheels',
  'interior_front',
  'interior_rear',
  'odometer',
  'extra',
] as const;
export type PhotoView = (typeof photoViews)[number];
export const photoViewNames: Record<PhotoView, string> = {
  front: 'Front',
  rear: 'Rear',
  left: 'Left side',
  right: 'Right side',
  roof_hood: 'Roof and hood',
  wheels: 'Wheels',
  interior_front: 'Front seats',
  interior_rear: 'Rear seats',
  odometer: 'Odometer',
  extra: 'Extra',
};

export const photoMoments = ['before', 'after', 'second_look'] as const;
export type PhotoMoment = (typeof photoMoments)[number];
export const photoMomentNames: Record<PhotoMoment, string> = {
  before: 'Before',
  after: 'After',
  second_look: 'Second look',
};

const views: Record<PhotoSet, readonly PhotoView[]> = {
  none: [],
  // Walking round the car once.
  quick: ['front', 'left', 'rear', 'right'],
  full: ['front', 'left', 'rear', 'right', 'roof_hood', 'wheels', 'interior_front', 'interior_rear', 'odometer'],
};

/** The views a set asks for, in the order of one walk round the car. */
export function viewsOf(set: PhotoSet): readonly PhotoView[] {
  return views[set];
}

/** What a service asks for when its owner has not said: add-ons ride along with another line. */
export function usualPhotoSet(kind: 'package' | 'single' | 'add_on'): PhotoSet {
  return kind === 'add_on' ? 'none' : 'quick';
}

export function largestSet(sets: readonly PhotoSet[]): PhotoSet {
  return sets.reduce<PhotoSet>((a, b) => (photoSets.indexOf(b) > photoSets.indexOf(a) ? b : a), 'none');
}

export function missingViews(set: PhotoSet, taken: readonly PhotoView[]): PhotoView[] {
  return viewsOf(set).filter((view) => !taken.includes(view));
}

/** Why views are missing, to pick from. */
export const missingReasons = [
  'Raining',
  'Customer in a hurry',
  'Parked against a wall',
  'Too dark',
  'Camera does not work',
] as const;

/** Why work starts without a walk-round, to pick from. */
export const skipReasons = [
  'Customer in a hurry',
  'Raining hard',
  'Fleet car, marks are known',
  'Phone does not work',
] as const;
