import type { Place } from '@/features/ui';

const PLACES = [
  { href: '/', label: 'Catalogue', holds: /^\/(?:orbits\/.*)?$/ },
  { href: '/systems', label: 'Systems', holds: /^\/systems(?:\/|$)/ },
  { href: '/bench', label: 'Bench', holds: /^\/bench(?:\/|$)/ },
  { href: '/desk', label: 'Desk', holds: /^\/desk(?:\/|$)/ },
] as const;

/** The four places as a page shows them; pressing the one that is shown goes to its top. */
export const placesFor = (path: string, waiting: number): Place[] =>
  PLACES.map(({ href, label, holds }) => ({
    href,
    label,
    active: holds.test(path),
    ...(href === '/desk' && { waiting }),
    ...(path === href && { onPressAgain: goToTop }),
  }));

/** Up to the top; at the top already, to the search line, which a thumb does not reach. */
function goToTop(): void {
  if (window.scrollY > 0) window.scrollTo({ top: 0, behavior: 'smooth' });
  else document.querySelector<HTMLInputElement>('main input[type="search"]')?.focus();
}
