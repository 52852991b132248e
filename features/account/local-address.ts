/** Where to go after signing in: a page of this site, never another one. Anything else leads to the Desk. */
export const localAddress = (next: string): string => (/^\/(?![/\\])/.test(next) ? next : '/desk');
