import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { ServiceName } from './menu.ts';

/** One visit of the morning that everybody looks at; times by the clock on the wall. */
export interface ScriptedVisit {
  from: string;
  services: readonly ServiceName[];
  size: SizeClass;
  /** Set off, arrived, work started, done; those after 11:00 are still to come. */
  times?: readonly [string, string, string, string];
  calledOff?: { at: string; reason: string };
  trouble?: { at: string; kind: 'no_water'; note: string };
  /** The drive from the visit before is longer than the gap. */
  isTight?: true;
}

export interface ScriptedVan {
  van: string;
  crew: readonly string[];
  inAt: string;
  visits: readonly ScriptedVisit[];
}

/** Today at 11:00: seven done, two working, one on site, one on the way, one late, one called off, the rest placed. */
export const todayScript: readonly ScriptedVan[] = [
  {
    ...{ van: 'Plover', crew: ['Idris Vale', 'Juno Marsh'], inAt: '07:28' },
    visits: [
      { from: '08:00', services: ['Wash and wax'], size: 'sedan', times: ['07:42', '08:01', '08:04', '08:57'] },
      {
        ...{ from: '09:15', services: ['Inside and out', 'Pet hair'], size: 'large_suv' },
        times: ['08:58', '09:14', '09:17', '10:48'],
      },
      { from: '11:15', services: ['One-step polish'], size: 'small_suv' },
      { from: '13:50', services: ['Two-step polish'], size: 'coupe' },
    ],
  },
  {
    ...{ van: 'Gannet', crew: ['Sefa Lund'], inAt: '07:24' },
    visits: [
      { from: '07:50', services: ['Maintenance wash'], size: 'coupe', times: ['07:32', '07:49', '07:52', '08:41'] },
      { from: '09:05', services: ['Maintenance wash'], size: 'small_suv', times: ['08:44', '09:04', '09:07', '10:11'] },
      { from: '10:45', services: ['Wash and wax'], size: 'sedan', times: ['10:38', '10:56', '11:02', '12:18'] },
      { from: '13:05', services: ['Maintenance wash'], size: 'sedan' },
      { from: '14:20', services: ['Wash and wax', 'Engine bay'], size: 'small_suv' },
    ],
  },
  {
    ...{ van: 'Knot', crew: ['Tomas Reyes', 'Wyn Abara'], inAt: '07:27' },
    visits: [
      {
        from: '08:00',
        services: ['Full interior', 'Pet hair'],
        size: 'van',
        times: ['07:44', '08:05', '08:09', '11:20'],
      },
      { from: '10:25', services: ['Wash and wax'], size: 'sedan' },
      { from: '13:00', services: ['Full interior'], size: 'small_suv' },
      { from: '14:45', services: ['Maintenance wash'], size: 'sedan' },
    ],
  },
  {
    ...{ van: 'Dunlin', crew: ['Priya Noor', 'Petra Hale'], inAt: '07:46' },
    visits: [
      {
        ...{ from: '08:30', services: ['Wash and wax', 'Clay lube decontamination'], size: 'small_suv' },
        times: ['08:12', '08:31', '08:34', '10:22'],
      },
      { from: '11:05', services: ['Inside and out'], size: 'sedan', times: ['10:49', '11:08', '11:12', '12:10'] },
      {
        ...{ from: '13:10', services: ['Inside and out'], size: 'coupe' },
        calledOff: { at: '09:40', reason: 'Customer is ill, books again' },
      },
      { from: '14:40', services: ['Full interior'], size: 'sedan' },
    ],
  },
  {
    ...{ van: 'Curlew', crew: ['Mara Quist', 'Lio Fenn'], inAt: '07:22' },
    visits: [
      { from: '07:50', services: ['Maintenance wash'], size: 'sedan', times: ['07:33', '07:51', '07:54', '08:47'] },
      {
        ...{ from: '09:10', services: ['One-step polish'], size: 'sedan', times: ['08:50', '09:11', '09:16', '12:02'] },
        trouble: { at: '10:37', kind: 'no_water', note: 'Spigot is dry. Working from the tank, about a quarter left.' },
      },
      { from: '12:55', services: ['Wash and wax'], size: 'large_suv' },
      { from: '15:10', services: ['Maintenance wash'], size: 'coupe' },
    ],
  },
  {
    ...{ van: 'Fulmar', crew: ['Beau Okoro'], inAt: '08:05' },
    visits: [
      { from: '08:50', services: ['Wash and wax'], size: 'sedan', times: ['08:33', '08:52', '08:55', '10:24'] },
      { from: '11:15', services: ['Full interior'], size: 'coupe' },
      { from: '13:15', services: ['Inside and out'], size: 'sedan', isTight: true },
    ],
  },
];

/** Waiting without a van; days count working days from today, the window is by the clock. */
export const unplacedScript = [
  { services: ['Wash and wax'], size: 'large_suv', days: [0, 0], window: ['14:00', '17:00'], cars: 1 },
  { services: ['Inside and out', 'Pet hair'], size: 'sedan', days: [1, 1], window: ['09:00', '13:00'], cars: 1 },
  { services: ['Full interior', 'Leather care'], size: 'van', days: [1, 2], window: ['08:00', '16:00'], cars: 1 },
  { services: ['Maintenance wash'], size: 'van', days: [0, 2], window: ['15:00', '12:00'], cars: 3 },
] as const satisfies readonly {
  services: readonly ServiceName[];
  size: SizeClass;
  days: readonly [number, number];
  window: readonly [string, string];
  cars: number;
}[];
