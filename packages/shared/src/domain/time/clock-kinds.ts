/** Kinds of time on the clock, in the order in which they are offered. */
export const clockKinds = ['job', 'travel', 'waiting', 'shop', 'training', 'rest_break', 'meal_break'] as const;
export type ClockKindName = (typeof clockKinds)[number];
export const clockKindNames: Record<ClockKindName, string> = {
  job: 'Work',
  travel: 'Travel',
  waiting: 'Waiting',
  shop: 'Shop',
  training: 'Training',
  rest_break: 'Rest break',
  meal_break: 'Meal break',
};
