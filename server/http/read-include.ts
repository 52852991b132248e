import { invalidQuery } from '@/server/errors';

/**
 * Whether `include` asks for incipits.
 *
 * @throws {Problem} `invalid-query` when it asks for anything else.
 */
export function readInclude(include: unknown): boolean {
  if (include === undefined || include === '') return false;
  if (include !== 'incipit')
    throw invalidQuery([{ pointer: '#include', message: 'include can be incipit, and nothing else.' }]);
  return true;
}
