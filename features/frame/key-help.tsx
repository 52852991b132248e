import { useCallback, useState } from 'react';
import { DefinitionRows, Sheet, Text, usePageKeys } from '@/features/ui';

const KEYS = [
  ['/', 'the search line'],
  ['j  k', 'next and previous row or entry'],
  ['Enter', 'open it'],
  ['Esc', 'close what is open'],
  ['g  then  c s b d', 'Catalogue, Systems, Bench, Desk'],
  ['Ctrl Enter', 'on the Bench check, on the Desk record'],
  ['c  a  r  d', 'on the Desk claim, accept, return, decline; these select, they do not record'],
] as const;

/** `?` lists the keys. */
export function KeyHelp() {
  const [open, setOpen] = useState(false);
  usePageKeys({ '?': useCallback(() => setOpen(true), []) });
  return (
    <Sheet open={open} onClose={() => setOpen(false)} title="Keys">
      <DefinitionRows nameWidth={152} ruled rows={KEYS.map(([keys, meaning]) => ({ name: keys, value: meaning }))} />
      <Text size={13} tone="muted">
        Single letters act only while no field has the focus.
      </Text>
    </Sheet>
  );
}
