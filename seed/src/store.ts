import * as models from '@driprail/api/db/models/index';
import { inTransaction } from '@driprail/api/db/sequelize';
import type { DemoRows } from './rows.ts';
import { storeBilling } from './store-billing.ts';
import { storeVisits } from './store-visits.ts';

/**
 * Writes all rows in one transaction, so that a seeding cut short leaves an empty database behind. The services, one
 * call per job and press, would take minutes for some 1,700 jobs; the constraints hold all the same.
 * Job numbers come from the database's own sequence, in the order in which the jobs were booked.
 */
export function storeRows(rows: DemoRows, passwordHash: string): Promise<void> {
  return inTransaction(async (transaction) => {
    const options = { transaction };
    await models.CompanySettings.bulkCreate(rows.settings, options);
    await models.Person.bulkCreate(rows.people, options);
    await models.TipStanding.bulkCreate(rows.tipStandings, options);
    await models.TimeOff.bulkCreate(rows.timeOff, options);
    const users = rows.users.map((user) => ({ ...user, passwordHash }));
    await models.User.bulkCreate(users, options);
    await models.Van.bulkCreate(rows.vans, options);
    await models.VanCrew.bulkCreate(rows.vanCrew, options);
    await models.Customer.bulkCreate(rows.customers, options);
    await models.CustomerCrew.bulkCreate(rows.customerCrew, options);
    await models.CustomerConsent.bulkCreate(rows.customerConsents, options);
    await models.Address.bulkCreate(rows.addresses, options);
    await models.Vehicle.bulkCreate(rows.vehicles, options);
    await models.Service.bulkCreate(rows.services, options);
    await models.ServicePrice.bulkCreate(rows.servicePrices, options);
    await models.Job.bulkCreate(rows.jobs, options);
    await models.Stop.bulkCreate(rows.stops, options);
    await storeVisits(rows, transaction);
    await models.JobLine.bulkCreate(rows.jobLines, options);
    await models.VisitLine.bulkCreate(rows.visitLines, options);
    await models.VisitCrew.bulkCreate(rows.visitCrew, options);
    await models.VisitEvent.bulkCreate(rows.visitEvents, options);
    await models.ClockEntry.bulkCreate(rows.clockEntries, options);
    await models.Tip.bulkCreate(rows.tips, options);
    await models.PayRate.bulkCreate(rows.payRates, options);
    await models.PayRuleSet.bulkCreate(rows.payRules, options);
    await models.PayWeek.bulkCreate(rows.payWeeks, options);
    await models.PayAdjustment.bulkCreate(rows.payAdjustments, options);
    await models.PayPlanRow.bulkCreate(rows.payPlans, options);
    await models.PayAgreement.bulkCreate(rows.payAgreements, options);
    await models.RefundReason.bulkCreate(rows.refundReasons, options);
    await models.TimeOffRuleRow.bulkCreate(rows.timeOffRules, options);
    await models.TimeOffAdjustment.bulkCreate(rows.timeOffAdjustments, options);
    await models.ServiceChecklist.bulkCreate(rows.serviceChecklists, options);
    await models.WorkEventRow.bulkCreate(rows.workEvents, options);
    await models.JobChange.bulkCreate(rows.jobChanges, options);
    await storeBilling(rows, transaction);
  });
}
