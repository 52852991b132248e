import type { Entry, Stability } from '@/schemas/generated/contract';
import { type FieldError, invalidQuery } from '@/server/errors';
import { readTypedNumber } from '@/server/formulas/typed-number';
import { DECIMAL, type Interval, roundingInterval } from '@/server/search/rounding-interval';
import { evidenceLevels, type SortName, sortNames, stabilities } from '@/server/search/search-words';
import { smallestRotation } from '@/server/search/smallest-rotation';

const MAX_TYPED = 200;
const MAX_RETURNS = 5000;
const MAX_ITINERARY = 5000;
const MAX_TEXT = 200;
const MAX_COORDINATES = 16;
const MAX_SLUG = 40;
const SIGNED_DECIMAL = /^[+-]?[0-9]+(?:\.[0-9]+)?(?:[eE][+-]?[0-9]{1,2})?$/;
const PARAMETER = /^parameters\[([A-Za-z][A-Za-z0-9_]{0,31})\]$/;

/** What a search asks for; null where it does not ask. */
export interface OrbitSearch {
  system: string | null;
  /** Values by name, in the order of the names. */
  parameters: readonly (readonly [name: string, value: number])[];
  period: Interval | null;
  periodMin: string | null;
  periodMax: string | null;
  returns: { from: number; to: number } | null;
  stability: Stability[] | null;
  itinerary: string | null;
  itineraryContains: string | null;
  evidence: Entry['evidence']['level'][] | null;
  text: string | null;
  near: string[] | null;
  sort: SortName;
}

type Query = Readonly<Record<string, unknown>>;

/**
 * Read what a search asks for.
 *
 * @param also  Names of parameters that somebody else reads (`limit`, `after`, `include`).
 * @throws {Problem} `invalid-query` with a pointer `#name` for every parameter that is unknown, repeated or malformed.
 */
export function readSearch(query: Query, also: readonly string[] = []): OrbitSearch {
  const reader = new Reader(query);
  const near = reader.read('near', readPoint);
  const system = reader.read('system', readSlug);
  const search: OrbitSearch = {
    system,
    parameters: reader.parameters(),
    period: reader.read('period', readDigits),
    periodMin: reader.read('periodMin', readBound),
    periodMax: reader.read('periodMax', readBound),
    returns: reader.read('returns', readReturns),
    stability: reader.read('stability', listReader(stabilities)),
    itinerary: reader.read('itinerary', (typed) => smallestRotation(readLetters(typed))),
    itineraryContains: reader.read('itineraryContains', readLetters),
    evidence: reader.read('evidence', listReader(evidenceLevels)),
    text: reader.read('text', readText),
    near,
    sort: reader.read('sort', readSort) ?? defaultSort(system, near),
  };
  if (near && !system)
    reader.fail('near', 'needs a system: the order of its variables gives the coordinates their meaning');
  if (search.sort === 'distance' && !near) reader.fail('sort', 'by distance needs near');
  reader.refuseUnknown(also);
  return search;
}

const defaultSort = (system: string | null, near: string[] | null): SortName => {
  if (near) return 'distance';
  return system ? 'period' : 'newest';
};

/** A reason why a value is not understood; the rest of a sentence that begins with the parameter's name. */
class Misread extends Error {}

/** Reads parameters one by one and remembers what was wrong with them. */
class Reader {
  private readonly errors: FieldError[] = [];
  private readonly known = new Set<string>();

  constructor(private readonly query: Query) {}

  /** An empty parameter asks for nothing. */
  read<T>(name: string, understand: (typed: string) => T): T | null {
    this.known.add(name);
    const typed = this.query[name];
    if (typed === undefined || typed === '') return null;
    try {
      if (typeof typed !== 'string') throw new Misread('is given more than once');
      if (typed.includes('\u0000')) throw new Misread('holds the character U+0000');
      return understand(typed.trim());
    } catch (error) {
      if (!(error instanceof Misread)) throw error;
      this.fail(name, error.message);
      return null;
    }
  }

  parameters(): [string, number][] {
    const names = Object.keys(this.query).filter((name) => PARAMETER.test(name));
    return names.sort().flatMap((name) => {
      const value = this.read(name, readNumber);
      return value === null ? [] : [[PARAMETER.exec(name)![1]!, value] as [string, number]];
    });
  }

  fail(name: string, reason: string): void {
    this.errors.push({ pointer: `#${name}`, message: `${name} ${reason}.` });
  }

  refuseUnknown(also: readonly string[]): void {
    for (const name of Object.keys(this.query)) {
      if (!this.known.has(name) && !also.includes(name))
        this.fail(name.slice(0, MAX_TEXT), 'is not a parameter of a search');
    }
    if (this.errors.length > 0) throw invalidQuery(this.errors);
  }
}

function readSlug(typed: string): string {
  if (!/^[a-z][a-z0-9-]*$/.test(typed) || typed.length > MAX_SLUG) throw new Misread('is not the slug of a system');
  return typed;
}

function readDigits(typed: string): Interval {
  const interval = typed.length <= MAX_TYPED ? roundingInterval(typed) : null;
  if (!interval)
    throw new Misread('is a positive decimal number, such as 1.5587: it matches every period that rounds to it');
  return interval;
}

function readBound(typed: string): string {
  if (typed.length > MAX_TYPED || !DECIMAL.test(typed)) throw new Misread('is a positive decimal number');
  return typed.replace('+', '');
}

function readNumber(typed: string): number {
  const read = readTypedNumber(typed);
  if (!read.ok) throw new Misread('is a number, such as 28 or 8/3');
  return read.number.value;
}

function readReturns(typed: string): { from: number; to: number } {
  const [, first, last] = /^([0-9]{1,5})(?:\.\.([0-9]{1,5}))?$/.exec(typed) ?? [];
  const from = parseInt(first ?? '0', 10);
  const to = parseInt(last ?? first ?? '0', 10);
  if (from < 1 || to < from || to > MAX_RETURNS) {
    throw new Misread(`is a whole number from 1 to ${MAX_RETURNS}, or a range such as 2..5`);
  }
  return { from, to };
}

function readLetters(typed: string): string {
  if (!/^[A-Za-z0-9]+$/.test(typed) || typed.length > MAX_ITINERARY) {
    throw new Misread(`is made of letters and digits, at most ${MAX_ITINERARY}`);
  }
  return typed;
}

function readText(typed: string): string {
  if (Array.from(typed).length > MAX_TEXT) throw new Misread(`is at most ${MAX_TEXT} characters long`);
  return typed;
}

function readPoint(typed: string): string[] {
  const coordinates = typed.split(',').map((coordinate) => coordinate.trim());
  const good = coordinates.every((coordinate) => coordinate.length <= MAX_TYPED && SIGNED_DECIMAL.test(coordinate));
  if (!good || coordinates.length > MAX_COORDINATES) {
    throw new Misread('is a point: decimal numbers separated by commas, such as -13.76,-19.57,27');
  }
  return coordinates.map((coordinate) => coordinate.replace(/^\+/, ''));
}

function readSort(typed: string): SortName {
  const found = sortNames.find((name) => name === typed);
  if (!found) throw new Misread(`is one of ${sortNames.join(', ')}`);
  return found;
}

const listReader =
  <T extends string>(allowed: readonly T[]) =>
  (typed: string): T[] => {
    const chosen = typed.split(',').map((word) => word.trim());
    const known = allowed.filter((word) => chosen.includes(word));
    if (known.length !== new Set(chosen).size) throw new Misread(`is one or several of ${allowed.join(', ')}`);
    return known;
  };
