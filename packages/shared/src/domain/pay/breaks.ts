/**
 * Whether a break is off the clock: only one free of duty and at least as long as the rule asks (29 CFR 785.19);
 * short rests always count (29 CFR 785.18).
 */
export function isOffDuty(seconds: number, isFreeOfDuty: boolean, leastMinutes = 30): boolean {
  return isFreeOfDuty && seconds >= leastMinutes * 60;
}
