import { type ReactNode, useId } from 'react';

export interface RadioOption<Value extends string> {
  value: Value;
  label: ReactNode;
  /** Under the label (list only). */
  hint?: ReactNode;
  /** A key that selects it, shown at the right (list only). */
  keyHint?: string;
  /** Why it can't be chosen now (list only). */
  disabledBecause?: string | null;
}

export interface RadioGroupProps<Value extends string> {
  legend: ReactNode;
  /** The legend is read out but not shown. */
  hideLegend?: boolean;
  value: Value | null;
  onChange: (value: Value) => void;
  options: readonly RadioOption<Value>[];
  /** `list`: one below the other, with hints. `segments`: boxes side by side. `inline`: words in a row. */
  kind?: 'list' | 'segments' | 'inline';
}

interface OptionProps<Value extends string> {
  option: RadioOption<Value>;
  name: string;
  checked: boolean;
  onChange: (value: Value) => void;
}

function ListOption<Value extends string>({ option, name, checked, onChange }: OptionProps<Value>) {
  const id = useId();
  const hint = option.disabledBecause ?? option.hint;
  return (
    <div className="r-radio-row">
      <div className="r-choice">
        <input
          id={id}
          type="radio"
          className="r-radio"
          name={name}
          checked={checked}
          onChange={() => onChange(option.value)}
          {...(option.disabledBecause && { disabled: true })}
          {...(hint && { 'aria-describedby': `${id}-hint` })}
          {...(option.keyHint && { 'aria-keyshortcuts': option.keyHint })}
        />
        <label htmlFor={id} className="r-choice-label r-ink">
          {option.label}
        </label>
        {option.keyHint ? (
          <span className="r-kbd" aria-hidden="true">
            {option.keyHint}
          </span>
        ) : null}
      </div>
      {hint ? (
        <div id={`${id}-hint`} className="r-choice-hint">
          {hint}
        </div>
      ) : null}
    </div>
  );
}

function WordOption<Value extends string>({
  option,
  name,
  checked,
  onChange,
  kind,
}: OptionProps<Value> & { kind: string }) {
  return (
    <label className={kind === 'segments' ? 'r-segment' : 'r-inline-choice'}>
      <input type="radio" name={name} checked={checked} onChange={() => onChange(option.value)} />
      <span>{option.label}</span>
    </label>
  );
}

/** One of a few; the arrow keys move among them. */
export function RadioGroup<Value extends string>(props: RadioGroupProps<Value>) {
  const { legend, hideLegend, value, onChange, options, kind = 'list' } = props;
  const name = useId();
  return (
    <fieldset className="r-group">
      <legend className={hideLegend ? 'r-hidden' : 'r-label'}>{legend}</legend>
      <div className={kind === 'segments' ? 'r-segments' : kind === 'inline' ? 'r-inline' : undefined}>
        {options.map((option) => {
          const shared = { option, name, checked: option.value === value, onChange };
          return kind === 'list' ? (
            <ListOption key={option.value} {...shared} />
          ) : (
            <WordOption key={option.value} {...shared} kind={kind} />
          );
        })}
      </div>
    </fieldset>
  );
}
