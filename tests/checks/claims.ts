import type { SystemDocument } from '@/schemas/generated/contract';
import type { ClaimBody } from '@/server/checks/read-claim';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import { checkSystem } from '@/server/formulas/check-system';
import { builtInSystems } from '@/server/systems/built-in-systems';

/** A document as a checked system. */
export function systemOf(document: SystemDocument): CheckedSystem {
  const checked = checkSystem(document);
  if (!checked.ok) throw new Error(checked.errors.map(({ message }) => message).join(' '));
  return checked.system;
}

/** A system of two variables x and y from its right-hand sides. */
export const planar = (x: string, y: string): CheckedSystem =>
  systemOf({ name: 'planar', variables: [{ name: 'x' }, { name: 'y' }], parameters: [], equations: { x, y } });

/** x' = −y, y' = x: circles of period 2π. */
export const circle = planar('-y', 'x');

export const lorenz = systemOf(builtInSystems.find(({ slug }) => slug === 'lorenz')!);

/** The orbit AB, to 14 digits; D. Viswanath, Nonlinearity 16 (2003) 1035–1056, gives the same. */
export const LORENZ_AB: ClaimBody = {
  section: 'z-27',
  point: ['-13.763610682134', '-19.578751942452', '27'],
  period: '1.5586522107161747',
  returns: 2,
};
