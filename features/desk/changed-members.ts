import type { DraftBody } from '@/schemas/generated/contract';

/** A member's value as people read it: text as typed, lists separated by commas, the rest as JSON. */
export function memberText(value: unknown): string {
  if (value === undefined) return '–';
  if (typeof value === 'string') return value;
  if (Array.isArray(value) && value.every((item) => typeof item === 'string' || typeof item === 'number'))
    return value.join(', ');
  return JSON.stringify(value);
}

/** The members of a body that differ between two revisions, old beside new. */
export function changedMembers(before: DraftBody, now: DraftBody): { member: string; old: string; now: string }[] {
  const names = [...new Set([...Object.keys(before), ...Object.keys(now)])];
  return names
    .map((member) => ({ member, old: memberText(before[member]), now: memberText(now[member]) }))
    .filter(({ old, now: current }) => old !== current);
}
