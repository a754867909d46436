/** What each rule may look at. Authorise complete records only: an absent field would be allowed by CASL. */
export interface SubjectFields {
  Visit: { id: string; crewPersonIds: string[]; day: string | null; daysFromToday: number | null };
  Job: { id: string; crewPersonIds: string[] };
  /** What a job costs and what was paid, seen from one of its visits. */
  Bill: { id: string; crewPersonIds: string[]; day: string | null; daysFromToday: number | null };
  /** Money that a person took in hand and has not handed in. */
  Cash: { personId: string };
  Customer: { id: string };
  Person: { id: string };
  Van: { id: string };
  Service: { id: string };
  ClockEntry: { id: string; personId: string };
  Settings: { id: number };
  Rate: { id: string };
  PayWeek: { id: string };
  Statement: { personId: string; state: 'draft' | 'checked' | 'locked' };
  /** The running week's pay, before it is locked. */
  Estimate: { personId: string };
  /** Hours of paid time off and how they came about. */
  TimeOffBalance: { personId: string };
  Payday: { id: string };
  /** Everything kept about one person's pay. */
  PayRecord: { personId: string };
  Login: { id: string };
  LocalMail: { id: string };
  AuditEntry: { id: number };
}
export type SubjectName = keyof SubjectFields;
export type Action = 'read' | 'create' | 'update' | 'remove' | 'plan' | 'mark' | 'tip' | 'collect' | 'refund' | 'erase';
