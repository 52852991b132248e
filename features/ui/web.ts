import type { HTMLAttributes } from 'react';

interface WebAttributes extends Omit<HTMLAttributes<HTMLElement>, 'style' | 'className'> {
  inert?: boolean;
}

/** Attributes that the web has and React Native's types leave out, to be spread on a View or a Text. */
export const web = (attributes: WebAttributes): object => attributes;
