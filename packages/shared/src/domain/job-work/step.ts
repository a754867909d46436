import type { Stage } from './stages.ts';

export const pours = ['bottle', 'dose'] as const;
export const stepCases = ['exterior', 'interior'] as const;
export const towelUses = ['wheels', 'paint', 'glass', 'interior'] as const;
export type TowelUse = (typeof towelUses)[number];
export const towelUseNames: Record<TowelUse, string> = {
  wheels: 'Wheel towel',
  paint: 'Paint towel',
  glass: 'Glass towel',
  interior: 'Interior towel',
};
export const stepCaseNames = { exterior: 'Exterior case', interior: 'Interior case' } as const;

/** One step of a service's checklist. */
export interface CheckStep {
  id: string;
  stage: Stage;
  words: string;
  /** In the house's own words; empty where none is used. */
  product: string;
  /** "10:1", "straight" or empty. */
  ratio: string;
  /** From a mixed bottle, or dosed from a straight one; null where no product is used. */
  pour: (typeof pours)[number] | null;
  /** For a dose: the container and how much, "1 oz into 4 gallons". */
  dose: string;
  kitCase: (typeof stepCases)[number] | null;
  towel: { use: TowelUse; color: string } | null;
  caution: string;
  /** Has to be ticked by itself: "done up to here" leaves it open. */
  isAlone: boolean;
}

/** One step of one line of a job. */
export interface StepRef {
  lineId: string;
  stepId: string;
}

export function stepKey({ lineId, stepId }: StepRef): string {
  return `${lineId}/${stepId}`;
}
