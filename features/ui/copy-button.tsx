import { useEffect, useRef, useState } from 'react';
import { useAnnounce } from './announce';
import { Button } from './button';
import { copyToClipboard } from './copy-to-clipboard';
import { TextButton } from './text-button';

export interface CopyButtonProps {
  /** What is copied: in full, as stored. */
  text: string | (() => string | Promise<string>);
  /** What it is, for the accessible name: "Copy period". */
  what?: string;
  /** Said after copying; by default "Copied, 42 digits" for a number, else "Copied". */
  said?: string;
  children?: string;
  size?: 13 | 14 | 16;
  /** Drawn as a link (default) or as one of the button kinds. */
  kind?: 'link' | 'button' | 'filled' | 'quiet';
}

/** How long the button reads "Copied". */
const SHOWN_MS = 2000;

function sentenceFor(text: string): string {
  const isNumber = /^[+\-−]?\d*\.?\d+(e[+-]?\d+)?$/i.test(text.trim());
  const digits = text.replace(/e.*$/i, '').replace(/\D/g, '').replace(/^0+/, '').length;
  return isNumber && digits > 0 ? `Copied, ${digits} ${digits === 1 ? 'digit' : 'digits'}` : 'Copied';
}

/** Copies a text, says so, and reads "Copied" for two seconds. */
export function CopyButton({ text, what, said, children = 'Copy', size = 16, kind = 'link' }: CopyButtonProps) {
  const announce = useAnnounce();
  const [shown, setShown] = useState<string | null>(null);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);

  const copy = async () => {
    const full = typeof text === 'string' ? text : await text();
    const copied = await copyToClipboard(full);
    setShown(copied ? 'Copied' : 'Not copied');
    announce(copied ? (said ?? sentenceFor(full)) : 'Not copied. Select the text and copy it.');
    clearTimeout(timer.current);
    timer.current = setTimeout(() => setShown(null), SHOWN_MS);
  };
  const shared = {
    onPress: () => void copy(),
    children: shown ?? children,
    ...(what && { name: shown ?? `${children} ${what}` }),
  };
  if (kind === 'link') return <TextButton size={size} {...shared} />;
  return <Button filled={kind === 'filled'} quiet={kind === 'quiet'} {...shared} />;
}
