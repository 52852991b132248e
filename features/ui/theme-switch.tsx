import { RadioGroup } from './radio-group';
import { type ThemeChoice, useThemeChoice } from './theme-choice';

const options: { value: ThemeChoice; label: string }[] = [
  { value: 'sheet', label: 'sheet' },
  { value: 'device', label: 'as the device' },
  { value: 'plate', label: 'plate' },
];

/** The theme: the sheet, the plate, or as the device asks. Kept on the device. */
export function ThemeSwitch() {
  const [choice, choose] = useThemeChoice();
  return <RadioGroup kind="inline" legend="Theme" hideLegend value={choice} onChange={choose} options={options} />;
}
