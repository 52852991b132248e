import { FieldFrame, type FieldFrameProps } from './field-frame';

export interface SelectOption<Value extends string> {
  value: Value;
  label: string;
}

export interface SelectProps<Value extends string> extends FieldFrameProps {
  value: Value;
  onChange: (value: Value) => void;
  options: readonly SelectOption<Value>[];
  /** 32 px high where one points with a mouse: beside a title. */
  compact?: boolean;
  disabled?: boolean;
  name?: string;
}

/** The browser's own list to choose one from. */
export function Select<Value extends string>(props: SelectProps<Value>) {
  const { value, onChange, options, compact, disabled, name } = props;
  return (
    <FieldFrame {...props}>
      {(wiring) => (
        <select
          {...wiring}
          className={compact ? 'r-input r-compact' : 'r-input'}
          value={value}
          onChange={(event) => {
            const chosen = options.find((option) => option.value === event.target.value);
            if (chosen) onChange(chosen.value);
          }}
          {...{ disabled, name }}
        >
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </FieldFrame>
  );
}
