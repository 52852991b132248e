const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

/** Text that reads as itself inside HTML, in an attribute too. */
export const escapeHtml = (text: string): string => text.replaceAll(/[&<>"']/g, (character) => entities[character]!);
