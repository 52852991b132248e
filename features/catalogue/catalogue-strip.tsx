import { useState } from 'react';
import type { OrbitFilter } from '@/features/api/orbits';
import { FilterSheet } from '@/features/catalogue/filter-sheet';
import { exportedWords, exportItems } from '@/features/catalogue/result-head';
import type { Results } from '@/features/catalogue/use-results';
import type { SearchLine } from '@/features/catalogue/use-search-line';
import { Button, CopyButton, Menu, Strip, useLayout } from '@/features/ui';

interface CatalogueStripProps {
  line: SearchLine;
  results: Results;
  filter: OrbitFilter;
}

/** The catalogue's actions on a phone: filters, link, export. */
export function CatalogueStrip({ line, results, filter }: CatalogueStripProps) {
  const [isOpen, setOpen] = useState(false);
  const layout = useLayout();
  if (layout !== 'phone') return null;
  const filters = line.terms.filter((term) => term.kind !== 'words').length;
  return (
    <>
      <Strip name="Actions on the result">
        <Button quiet opens="dialog" expanded={isOpen} onPress={() => setOpen(true)}>
          {filters > 0 ? `Filters ${filters}` : 'Filters'}
        </Button>
        <CopyButton kind="quiet" text={() => window.location.href} said="Link copied">
          Copy link
        </CopyButton>
        {results.items.length > 0 ? (
          <Menu
            kind="quiet"
            title={`Export all ${exportedWords(results.total)}`}
            label={`Export ${exportedWords(results.total)}`}
            items={[
              ...exportItems(filter),
              { key: 'releases', label: 'Releases of the whole catalogue', href: '/releases' },
            ]}
          />
        ) : null}
      </Strip>
      {isOpen ? <FilterSheet line={line} onClose={() => setOpen(false)} /> : null}
    </>
  );
}
