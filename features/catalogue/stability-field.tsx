import type { ReactNode } from 'react';
import { STABILITIES } from '@/features/catalogue/search-term';
import { Checkbox, RadioGroup, Select } from '@/features/ui';

interface StabilityFieldProps {
  legend: ReactNode;
  shape: 'column' | 'sheet' | 'row';
  values: readonly string[];
  onChange: (values: string[]) => void;
}

/** Every entry is decided: "undecided" is left to the search line. */
const SHOWN = STABILITIES.filter((value) => value !== 'undecided');
const ONE_OF = ['any', ...SHOWN].map((value) => ({ value, label: value }));

/** Stability: any number of boxes where there is room, else one of a few. */
export function StabilityField({ legend, shape, values, onChange }: StabilityFieldProps) {
  if (shape !== 'column') {
    const value = values.length > 1 ? null : (values[0] ?? 'any');
    const choose = (chosen: string) => onChange(chosen === 'any' ? [] : [chosen]);
    if (shape === 'row') return <Select label={legend} value={value ?? 'any'} options={ONE_OF} onChange={choose} />;
    return <RadioGroup legend={legend} kind="segments" value={value} options={ONE_OF} onChange={choose} />;
  }
  return (
    <fieldset className="r-group">
      <legend className="r-label">{legend}</legend>
      {SHOWN.map((value) => (
        <Checkbox
          key={value}
          label={value}
          checked={values.includes(value)}
          onChange={(checked) => onChange(SHOWN.filter((one) => (one === value ? checked : values.includes(one))))}
        />
      ))}
    </fieldset>
  );
}
