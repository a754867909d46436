/** How a workplace container was filled and who uses it. */
export interface ContainerUse {
  fromLabelledContainer: boolean;
  sameEmployeeOnly: boolean;
  keptUnderControl: boolean;
  sameShift: boolean;
}

/** Parts of a secondary label, 29 CFR 1910.1200(f)(6): either all of the first, or the second with data sheets at hand. */
export const WORKPLACE_LABEL = {
  full: ['product identifier', 'signal word', 'hazard statement(s)', 'pictogram(s)', 'precautionary statement(s)'],
  general: [
    'product identifier',
    'words, pictures, symbols or a mix giving at least general information on the hazards',
  ],
} as const;

/**
 * Only a container filled from a labelled one, by and for one person, under that person's control and used up within the
 * shift goes without a label (29 CFR 1910.1200(f)(8)): a bottle kept on the van overnight or shared has one, whatever its
 * size.
 */
export function needsLabel(use: ContainerUse): boolean {
  return !(use.fromLabelledContainer && use.sameEmployeeOnly && use.keptUnderControl && use.sameShift);
}
