import { useState } from 'react';
import { useFewOrbits } from '@/features/api/orbits';
import { countWords } from '@/features/catalogue/count-words';
import { FilterFields } from '@/features/catalogue/filter-fields';
import { searchFilter } from '@/features/catalogue/search-filter';
import { useSearchParser } from '@/features/catalogue/use-search-parser';
import { usePeriodSlices } from '@/features/catalogue/use-period-slices';
import { variablesOf } from '@/features/catalogue/variables-of';
import type { SearchLine } from '@/features/catalogue/use-search-line';
import { Button, Sheet, TextButton } from '@/features/ui';

interface FilterSheetProps {
  line: SearchLine;
  onClose: () => void;
}

/** The filters on a phone; they apply on *Show*, whose number follows while one types. */
export function FilterSheet({ line, onClose }: FilterSheetProps) {
  const { systems } = line;
  const [text, setText] = useState(line.text);
  const parse = useSearchParser(systems, text);
  const terms = parse(text);
  const periods = usePeriodSlices(terms);
  const found = useFewOrbits(searchFilter(terms), 1);
  const show = () => {
    line.setText(text);
    onClose();
  };
  const systemName = terms.find((term) => term.kind === 'system')?.name ?? '';
  return (
    <Sheet
      open
      onClose={onClose}
      title="Filters"
      action={<TextButton onPress={() => setText(systemName)}>Clear all</TextButton>}
      footer={
        <>
          <Button onPress={onClose}>Cancel</Button>
          <Button filled onPress={show}>
            {found.data ? `Show ${countWords(found.data.total)}` : 'Show'}
          </Button>
        </>
      }
    >
      <FilterFields
        shape="sheet"
        text={text}
        terms={terms}
        onText={setText}
        variables={variablesOf(terms, systems)}
        periods={periods}
      />
    </Sheet>
  );
}
