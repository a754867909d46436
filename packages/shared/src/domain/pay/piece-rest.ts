import { greatest, ZERO, type Exact } from '../money/exact.ts';

export interface PieceRestWeek {
  piecePay: Exact;
  /** Hourly and other pay, overtime premium left out. */
  otherPay: Exact;
  hours: Exact;
  restHours: Exact;
  /** Rest time that the other pay already covers, and its rate. */
  restHoursPaid: Exact;
  restRatePaid: Exact;
  minimumWage: Exact;
}

export interface PieceRestPay {
  divisorHours: Exact;
  compensationLessRest: Exact;
  averageRate: Exact;
  /** The average, or the minimum wage if that is higher. */
  restRate: Exact;
  restPay: Exact;
  /** What of the rest pay is still owed. */
  restDue: Exact;
}

/**
 * Rest and recovery time of piece workers, paid apart at the week's average hour (California Labor Code 226.2): pay
 * without rest pay and overtime premium, over hours without rest. Minutes are carried exactly.
 */
export function pieceRestPay(week: PieceRestWeek): PieceRestPay {
  const divisorHours = week.hours.sub(week.restHours);
  const alreadyPaid = week.restHoursPaid.mul(week.restRatePaid);
  const compensationLessRest = week.piecePay.add(week.otherPay).sub(alreadyPaid);
  const averageRate = compensationLessRest.div(divisorHours);
  const restRate = greatest(averageRate, week.minimumWage);
  const restPay = restRate.mul(week.restHours);
  return {
    divisorHours,
    compensationLessRest,
    averageRate,
    restRate,
    restPay,
    restDue: greatest(ZERO, restPay.sub(alreadyPaid)),
  };
}
