import type { ReactNode } from 'react';
import { followLink } from './follow-link';

export interface LinkTextProps {
  children: ReactNode;
  href: string;
  /** Done before the link is followed. */
  onPress?: () => void;
  /** Accessible name where the text alone does not say enough. */
  name?: string;
  /** Without underline: back links. */
  plain?: boolean;
  /** The link is a whole card or row: no link colours, a block. */
  whole?: boolean;
  /** Suggest this file name and download. */
  download?: string;
  /** px; inherited inside a text. */
  size?: 13 | 14 | 16;
  /** Give it a touch target of 44 px. */
  target?: boolean;
  current?: boolean;
  title?: string;
  id?: string;
}

const className = ({ plain, whole, size, target }: LinkTextProps): string =>
  [
    'r-link',
    plain && 'r-plain',
    whole && 'r-whole',
    target && 'r-target',
    size && 'r-reading',
    size && size < 16 && 'r-small',
  ]
    .filter(Boolean)
    .join(' ');

/** A real link. */
export function LinkText(props: LinkTextProps) {
  const { children, href, onPress, name, download, current, title, id } = props;
  return (
    <a
      href={href}
      className={className(props)}
      onClick={(event) => {
        onPress?.();
        followLink(event, href);
      }}
      {...(name && { 'aria-label': name })}
      {...(download !== undefined && { download })}
      {...(current && { 'aria-current': 'page' as const })}
      {...(title && { title })}
      {...(id && { id })}
    >
      {children}
    </a>
  );
}
