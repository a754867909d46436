import type { TroubleKind } from '@driprail/shared/domain/board/trouble';

/** What is usually said, for wet hands: several may be pressed. */
export const troublePicks: Record<TroubleKind, readonly string[]> = {
  nobody_home: ['Rang twice', 'Called, no answer', 'Waiting here'],
  no_access: ['Gate is shut', 'Code is wrong', 'Car is not here', 'Blocked in'],
  no_water: ['Spigot is off', 'Low pressure', 'Working from the tank'],
  weather: ['Rain', 'Lightning', 'Wind', 'Too hot', 'Too cold'],
  damage: ['On the car', 'On the property', 'There before work', 'Happened at work'],
  unsafe: ['Dog', 'Threatened', 'Traffic or slope', 'Bad wiring'],
  hurt: ['Eyes', 'Skin', 'Cut', 'Fall', 'Help is called'],
  crash: ['Nobody hurt', 'Help is called', 'Van drives on', 'Van is stuck'],
  unwell: ['Too hot', 'Dizzy', 'Stomach', 'Crew mate drives', 'Going home'],
  bottle: ['Leaking', 'Label is missing', 'Wrong product', 'Wrong ratio', 'Put aside'],
  van_trouble: ['Flat tire', 'Will not start', 'Generator', 'Water tank'],
  running_late: ['15 min', '30 min', '45 min', '1 h'],
  other: ['Call me'],
};

/** "30 min" and "1 h" as minutes, the most that was picked; null for none. */
export function lateMinutes(picked: readonly string[]): number | null {
  const minutes = picked.flatMap((word) => {
    const [, count, unit] = /^(\d+) (min|h)$/.exec(word) ?? [];
    return count ? [Number(count) * (unit === 'h' ? 60 : 1)] : [];
  });
  return minutes.length === 0 ? null : Math.max(...minutes);
}
