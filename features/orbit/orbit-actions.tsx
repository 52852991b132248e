import { useState } from 'react';
import { entryAddress } from '@/features/api/orbits';
import { CiteSheet } from '@/features/orbit/cite-sheet';
import { Button, CopyButton, Menu, Strip, useLayout } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

const FORMATS = [
  { format: 'json', label: 'JSON' },
  { format: 'csv', label: 'CSV' },
  { format: 'bib', label: 'BibTeX' },
  { format: 'csl.json', label: 'CSL-JSON' },
  { format: 'ris', label: 'RIS' },
] as const;

/** Cite, export, copy: at the right of the head, on a phone in the strip. */
export function OrbitActions({ entry }: { entry: Entry }) {
  const [isCiting, setCiting] = useState(false);
  const phone = useLayout() === 'phone';
  const actions = (
    <>
      <Button quiet={phone} opens="dialog" expanded={isCiting} onPress={() => setCiting(true)}>
        Cite
      </Button>
      <Menu
        kind={phone ? 'quiet' : 'button'}
        align="right"
        title={entry.status === 'withdrawn' ? 'Export, marked as withdrawn' : 'Export'}
        label="Export"
        items={FORMATS.map(({ format, label }) => ({
          key: format,
          label,
          href: entryAddress(entry.accession, format),
          download: `${entry.accession}.${format}`,
        }))}
      />
      <CopyButton kind={phone ? 'quiet' : 'filled'} text={() => allNumbers(entry)} said="Copied, all numbers as JSON">
        {phone ? 'Copy all' : 'Copy all numbers'}
      </CopyButton>
    </>
  );
  return (
    <>
      {phone ? <Strip name="Actions on the entry">{actions}</Strip> : actions}
      <CiteSheet entry={entry} open={isCiting} onClose={() => setCiting(false)} />
    </>
  );
}

/** What one needs to run the orbit again, as JSON; figures as stored. */
function allNumbers(entry: Entry): string {
  const { accession, system, parameters, section, point, returns, period, returnTimes, itinerary, multipliers } = entry;
  const numbers = {
    system: system.slug,
    parameters,
    section,
    point,
    returns,
    period,
    returnTimes,
    itinerary,
    multipliers,
  };
  return JSON.stringify({ accession, ...numbers, caution: entry.caution }, null, 2);
}
