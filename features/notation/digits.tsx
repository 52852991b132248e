import { type ClipboardEvent, Fragment } from 'react';
import { colour, CopyButton, font } from '@/features/ui';
import { type DigitRun, digitGroups } from './digit-groups';

export interface DigitsProps {
  /** The number as stored. */
  value: string;
  /** Significant digits confirmed here: ink over a verdigris rule; the rest is paler. Without it nothing is marked. */
  verified?: number;
  /** Significant digits shown. */
  max?: number;
  unit?: string;
  /** A Copy button beside it that takes the whole string. */
  copyable?: boolean;
  /** Accessible name of what is copied. */
  what?: string;
}

/** Most significant digits shown on a page. */
const MOST_SHOWN = 34;
/** Gap between groups of three; padding, so that a copied number has no spaces. */
const GAP = '0.2em';
/** Verified digits stand over it; nothing else on the site does. */
const RULE = {
  borderBottomWidth: 2,
  borderBottomStyle: 'solid',
  borderBottomColor: colour.verdigris,
  paddingBottom: 1,
} as const;

function Run({ run, marked }: { run: DigitRun; marked: boolean }) {
  const isPale = marked && !run.verified;
  return (
    <span
      style={{
        whiteSpace: 'nowrap',
        ...(run.gap && { paddingLeft: GAP }),
        ...(isPale && { color: colour.faint }),
        ...(marked && run.verified && RULE),
      }}
    >
      {run.text}
    </span>
  );
}

/** Selecting and copying gives characters that programs read: a hyphen for the minus sign. */
function copyPlain(event: ClipboardEvent): void {
  const selected = window.getSelection()?.toString() ?? '';
  if (!selected) return;
  event.preventDefault();
  event.clipboardData.setData('text/plain', selected.replaceAll('−', '-'));
}

/** A number in groups of three, its verified digits over the rule. */
export function Digits({ value, verified, max = MOST_SHOWN, unit, copyable, what }: DigitsProps) {
  const { runs, digits, shown, power } = digitGroups(value, verified ?? 0, max);
  return (
    <>
      <span style={{ fontFamily: font.number }} onCopy={copyPlain}>
        {runs.map((run, index) => (
          <Fragment key={index}>
            {run.gap ? <wbr /> : null}
            <Run run={run} marked={verified !== undefined} />
          </Fragment>
        ))}
        {shown < digits ? '…' : null}
        {power ? <span style={{ whiteSpace: 'nowrap' }}>{power}</span> : null}
        {unit ? ` ${unit}` : null}
      </span>
      {copyable ? (
        <>
          {' '}
          <CopyButton text={value} {...(what && { what })} />
        </>
      ) : null}
    </>
  );
}
