export type Role = 'owner' | 'dispatcher' | 'technician';
export const everyone = ['owner', 'dispatcher', 'technician'] as const satisfies readonly Role[];
/** Those who work at the desk. */
export const desk = ['owner', 'dispatcher'] as const satisfies readonly Role[];

/** Who asks. A login has one role; it may or may not belong to a person of the crew. */
export interface Actor {
  userId: string;
  personId: string | null;
  role: Role;
}
