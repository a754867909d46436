import { v7 } from 'uuid';
import type * as models from '@driprail/api/db/models/index';
import { randomFor } from './random.ts';

/** Columns that the database or the model fills in when they are left out. */
type FilledIn<T> = { [K in keyof T]-?: undefined extends T[K] ? K : null extends T[K] ? K : never }[keyof T];

/** What a model takes for a new row. */
export type Row<M extends { _creationAttributes: object }> = Omit<
  M['_creationAttributes'],
  FilledIn<M['_creationAttributes']>
> &
  Partial<Pick<M['_creationAttributes'], FilledIn<M['_creationAttributes']>>>;

/** The whole company as plain rows, in the order in which the tables depend on each other. */
export interface DemoRows {
  settings: Row<models.CompanySettings>[];
  people: Row<models.Person>[];
  tipStandings: Row<models.TipStanding>[];
  timeOff: Row<models.TimeOff>[];
  users: Row<models.User>[];
  vans: Row<models.Van>[];
  vanCrew: Row<models.VanCrew>[];
  customers: Row<models.Customer>[];
  customerCrew: Row<models.CustomerCrew>[];
  customerConsents: Row<models.CustomerConsent>[];
  addresses: Row<models.Address>[];
  vehicles: Row<models.Vehicle>[];
  services: Row<models.Service>[];
  servicePrices: Row<models.ServicePrice>[];
  jobs: (Row<models.Job> & { createdAt: Date })[];
  stops: Row<models.Stop>[];
  visits: Row<models.Visit>[];
  jobLines: Row<models.JobLine>[];
  visitLines: Row<models.VisitLine>[];
  visitCrew: Row<models.VisitCrew>[];
  visitEvents: Row<models.VisitEvent>[];
  clockEntries: Row<models.ClockEntry>[];
  tips: Row<models.Tip>[];
  payRates: Row<models.PayRate>[];
  payRules: Row<models.PayRuleSet>[];
  payWeeks: Row<models.PayWeek>[];
  payAdjustments: Row<models.PayAdjustment>[];
  payPlans: Row<models.PayPlanRow>[];
  payAgreements: Row<models.PayAgreement>[];
  refundReasons: Row<models.RefundReason>[];
  timeOffRules: Row<models.TimeOffRuleRow>[];
  timeOffAdjustments: Row<models.TimeOffAdjustment>[];
  serviceChecklists: Row<models.ServiceChecklist>[];
  workEvents: Row<models.WorkEventRow>[];
  jobChanges: Row<models.JobChange>[];
  walkRounds: Row<models.WalkRound>[];
  walkMarks: Row<models.WalkMark>[];
  walkLooks: Row<models.WalkLook>[];
  taxRates: Row<models.TaxRateRow>[];
  invoices: Row<models.Invoice>[];
  invoiceLines: Row<models.InvoiceLine>[];
  invoiceTaxes: Row<models.InvoiceTax>[];
  payments: Row<models.Payment>[];
  jobsPaid: Row<models.JobPaid>[];
  cashCounts: Row<models.CashCount>[];
  cashCountPayments: Row<models.CashCountPayment>[];
}

export function noRows(): DemoRows {
  return {
    settings: [],
    people: [],
    tipStandings: [],
    timeOff: [],
    users: [],
    vans: [],
    vanCrew: [],
    customers: [],
    customerCrew: [],
    customerConsents: [],
    addresses: [],
    vehicles: [],
    services: [],
    servicePrices: [],
    jobs: [],
    stops: [],
    visits: [],
    jobLines: [],
    visitLines: [],
    visitCrew: [],
    visitEvents: [],
    clockEntries: [],
    tips: [],
    payRates: [],
    payRules: [],
    payWeeks: [],
    payAdjustments: [],
    payPlans: [],
    payAgreements: [],
    refundReasons: [],
    timeOffRules: [],
    timeOffAdjustments: [],
    serviceChecklists: [],
    workEvents: [],
    jobChanges: [],
    walkRounds: [],
    walkMarks: [],
    walkLooks: [],
    taxRates: [],
    invoices: [],
    invoiceLines: [],
    invoiceTaxes: [],
    payments: [],
    jobsPaid: [],
    cashCounts: [],
    cashCountPayments: [],
  };
}

/** Makes uuids of version 7 that are the same on every run: their time counts up from `from`, one millisecond each. */
export function idsFrom(from: Date): () => string {
  const random = randomFor('ids');
  let msecs = from.getTime();
  return () => {
    msecs += 1;
    return v7({ msecs, random: Uint8Array.from({ length: 16 }, () => random.int(0, 255)) });
  };
}
