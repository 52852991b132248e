/** A member's JSON Pointer (RFC 6901) from its parent's. */
export const childPointer = (parent: string, member: string | number): string =>
  `${parent}/${String(member).replaceAll('~', '~0').replaceAll('/', '~1')}`;

/** The members a JSON Pointer walks through. */
const pointerParts = (pointer: string): string[] =>
  pointer
    .split('/')
    .slice(1)
    .map((part) => part.replaceAll('~1', '/').replaceAll('~0', '~'));

/** A JSON Pointer as people read it: `/point/1` is "point, item 2". */
export function pointerLabel(pointer: string): string {
  const parts = pointerParts(pointer).map((part) => (/^\d+$/.test(part) ? `item ${BigInt(part) + 1n}` : part));
  return parts.length === 0 ? 'The body' : parts.join(', ');
}
