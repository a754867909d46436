import type { Condition } from './condition.ts';
import type { PhotoSet, PhotoView } from './views.ts';
import { missingViews, photoViewNames } from './views.ts';

export interface WalkRoundFacts {
  paint: Condition | null;
  interior: Condition | null;
  hasItems: boolean | null;
  mayMove: boolean | null;
  missingReason: string;
  absentReason: string;
  initials: number[][] | null;
  photoViews: readonly { view: PhotoView }[];
}

/** What a walk-round still lacks before it can be finished, a sentence by field; empty when nothing does. */
export function lackingIn(facts: WalkRoundFacts, photoSet: PhotoSet): Record<string, string> {
  const fields: Record<string, string> = {};
  const missing = missingViews(
    photoSet,
    facts.photoViews.map(({ view }) => view),
  );
  if (missing.length > 0 && facts.missingReason === '') {
    const words = missing.map((view) => photoViewNames[view].toLowerCase()).join(', ');
    fields['missingReason'] = `Take the views that are missing, or pick why not: ${words}.`;
  }
  if (facts.paint === null) fields['paint'] = 'Choose how the paint is.';
  if (facts.interior === null) fields['interior'] = 'Choose how the interior is.';
  if (facts.hasItems === null) fields['hasItems'] = 'Say whether personal items lie in the car.';
  if (facts.mayMove === null) fields['mayMove'] = 'Ask whether the crew may move the car.';
  if ((facts.initials === null) === (facts.absentReason === '')) {
    fields['initials'] = 'Let the customer sign, or pick why nobody did.';
  }
  return fields;
}
