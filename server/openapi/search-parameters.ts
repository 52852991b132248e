import { type OperationParameter, queryParameter } from '@/server/openapi/operation';
import { evidenceLevels, sortNames, stabilities } from '@/server/search/search-words';

/** What selects entries and puts them in order. */
export const exportParameters: readonly OperationParameter[] = [
  queryParameter('system', 'Slug of a system.'),
  queryParameter('parameters', 'Values of parameters: parameters[rho]=28.', {
    type: 'object',
    additionalProperties: { type: 'string' },
  }),
  queryParameter('period', 'Digits: every period that rounds to them; 1.5587 is 1.55865 ≤ T < 1.55875.'),
  queryParameter('periodMin', 'Smallest period, exact and included.'),
  queryParameter('periodMax', 'Largest period, exact and included.'),
  queryParameter('returns', 'Number of returns, or a range such as 2..5.'),
  queryParameter('stability', `One or several, separated by commas: ${stabilities.join(', ')}.`),
  queryParameter('itinerary', 'Letters; matches up to cyclic shift.'),
  queryParameter('itineraryContains', 'Letters that occur one after the other somewhere in the itinerary, read round.'),
  queryParameter('evidence', `One or several, separated by commas: ${evidenceLevels.join(', ')}.`),
  queryParameter('text', 'Words in note, references or contributor.'),
  queryParameter('near', "A point in the system's order of variables, separated by commas; needs system."),
  queryParameter('sort', 'Order; by default period with a system, newest without, distance with near.', {
    enum: sortNames,
  }),
];

export const searchParameters: readonly OperationParameter[] = [
  ...exportParameters,
  queryParameter('include', 'incipit: also the drawn coordinate of every entry.', { enum: ['incipit'] }),
];
