import { exact, type Exact } from '../../money/exact.ts';
import { convertVolume, type VolumeUnit } from '../units/units.ts';

export type CheckValue =
  string | number | boolean | null | readonly CheckValue[] | { readonly [name: string]: CheckValue };
export type CheckResult = Record<string, CheckValue>;

/** Inputs that make no sense: the message is a sentence for the person who wrote them. */
export class ScenarioError extends RangeError {}

/** How a field's name ends says its unit: bottleFlOz, addTbsp, toWaterGal. */
const SUFFIXES = {
  FlOz: 'US fl oz',
  Ml: 'mL',
  L: 'L',
  Litres: 'L',
  Liters: 'L',
  Gal: 'US gal',
  Qt: 'US liquid qt',
  Pt: 'US liquid pt',
  Cup: 'US cup',
  Cups: 'US cup',
  Tbsp: 'US tbsp',
  Tsp: 'US tsp',
} as const satisfies Record<string, VolumeUnit>;

export type VolumeSuffix = keyof typeof SUFFIXES;

/** A volume as it was given, and the ending of its field's name. */
export interface GivenVolume {
  value: Exact;
  suffix: VolumeSuffix;
}

const DECIMAL = /^[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d{1,2})?$/i;

/** Reads a scenario's fields, each exactly or refused with a sentence that names it. */
export class ScenarioInputs {
  constructor(
    private readonly fields: Readonly<Record<string, unknown>>,
    private readonly place = '',
  ) {}

  get isEmpty(): boolean {
    return Object.keys(this.fields).length === 0;
  }

  has(...names: string[]): boolean {
    return names.every((name) => this.fields[name] !== undefined && this.fields[name] !== null);
  }

  /** The first of the names that is given, so that spellings of one field can be listed. */
  firstOf(...names: string[]): string | undefined {
    return names.find((name) => this.has(name));
  }

  raw(name: string): unknown {
    return this.fields[name];
  }

  text(name: string): string {
    const value = this.fields[name];
    if (typeof value !== 'string') throw this.problem(name, value === undefined ? 'is missing' : 'needs text');
    return value;
  }

  number(name: string): Exact {
    return this.asNumber(name, this.fields[name]);
  }

  /** More than zero or zero. */
  amount(name: string): Exact {
    const value = this.number(name);
    if (value.lt(0)) throw this.problem(name, 'may not be negative');
    return value;
  }

  percent(name: string): Exact {
    const value = this.amount(name);
    if (value.gt(100)) throw this.problem(name, 'is more than 100 percent');
    return value;
  }

  flag(name: string): boolean {
    const value = this.fields[name];
    if (value === undefined || value === null) return false;
    if (typeof value !== 'boolean') throw this.problem(name, 'needs true or false');
    return value;
  }

  numbers(name: string): Exact[] {
    return this.list(name).map((value, index) => this.asNumber(`${name}.${index}`, value));
  }

  texts(name: string): string[] {
    return this.list(name).map((value, index) => {
      if (typeof value !== 'string') throw this.problem(`${name}.${index}`, 'needs text');
      return value;
    });
  }

  objects(name: string): ScenarioInputs[] {
    return this.list(name).map((value, index) => {
      if (!isRecord(value)) throw this.problem(`${name}.${index}`, 'is no object');
      return new ScenarioInputs(value, `${this.place}${name}.${index}.`);
    });
  }

  /** The volume whose field starts with one of the words and ends with its unit; null where there is none. */
  volume(...starts: string[]): GivenVolume | null {
    for (const start of starts) {
      for (const suffix of Object.keys(SUFFIXES) as VolumeSuffix[]) {
        const name = start === '' ? lowerFirst(suffix) : `${start}${suffix}`;
        if (this.has(name)) return { value: this.amount(name), suffix };
      }
    }
    return null;
  }

  problem(name: string, what: string): ScenarioError {
    return new ScenarioError(`${this.place}${name} ${what}.`);
  }

  private list(name: string): unknown[] {
    const value = this.fields[name];
    if (!Array.isArray(value) || value.length === 0) throw this.problem(name, 'needs a list with at least one entry');
    return value as unknown[];
  }

  private asNumber(name: string, value: unknown): Exact {
    if (value === undefined || value === null) throw this.problem(name, 'is missing');
    if (typeof value !== 'number' && typeof value !== 'string') throw this.problem(name, 'needs a number');
    const text = String(value).trim().replace(/%$/, '').trim();
    if (!DECIMAL.test(text)) throw this.problem(name, `"${text}" is not a number`);
    const [mantissa = '', exponent = '0'] = text.toLowerCase().split('e');
    const plain = exact(mantissa.replace(/^([+-]?)\./, '$10.').replace(/\.$/, ''));
    return plain.mul(exact(10).pow(Number(exponent)) ?? 1);
  }
}

/** A volume in another unit, from the unit its field's name gave. */
export function inUnit({ value, suffix }: GivenVolume, to: VolumeUnit): Exact {
  return convertVolume(value, SUFFIXES[suffix], to);
}

export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** An exact value as the nearest JSON number, unrounded. */
export function plainNumber(value: Exact): number {
  return value.valueOf();
}

function lowerFirst(text: string): string {
  return `${text.charAt(0).toLowerCase()}${text.slice(1)}`;
}
