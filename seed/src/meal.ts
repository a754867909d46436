import { minuteOf } from './calendar.ts';

/** The meal follows the first visit planned to end at or after this. */
export const MEAL_AFTER = minuteOf('11:15');
export const MEAL_MINUTES = 30;
