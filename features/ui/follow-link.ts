import { router } from 'expo-router';
import type { MouseEvent } from 'react';

/** Addresses that the router answers; everything else is left to the browser. */
const isInside = (href: string): boolean => href.startsWith('/') && !/^\/(api|schemas|outbox)(\/|$)/.test(href);

/** Follow a link inside the site without loading a page; new tabs, downloads and other sites stay the browser's. */
export function followLink(event: MouseEvent<HTMLAnchorElement>, href: string): void {
  const plain = event.button === 0 && !event.metaKey && !event.ctrlKey && !event.shiftKey && !event.altKey;
  const { target } = event.currentTarget;
  if (event.defaultPrevented || !plain || !isInside(href) || (target && target !== '_self')) return;
  event.preventDefault();
  router.push(href);
}
