import { type ReactNode, useId } from 'react';
import { View } from 'react-native';
import { Text } from './text';
import { space } from './tokens';
import { web } from './web';

export interface FieldFrameProps {
  label: ReactNode;
  /** What is wrong with what was typed; shown under the control. */
  error?: string | null | undefined;
  /** What may be typed, or what was understood: "9 digits". */
  hint?: ReactNode;
  optional?: boolean;
  /** The label is read out but not shown. */
  hideLabel?: boolean;
}

/** What ties a control to its label, hint and error. */
export interface FieldWiring {
  id: string;
  'aria-describedby'?: string;
  'aria-invalid'?: true;
}

interface Props extends FieldFrameProps {
  children: (wiring: FieldWiring) => ReactNode;
}

/** Label above, control, then error or hint below; described-by is wired. */
export function FieldFrame({ label, error, hint, optional, hideLabel, children }: Props) {
  const id = useId();
  const hasHint = hint !== undefined && hint !== null && hint !== '';
  const describedBy = [error && `${id}-error`, hasHint && `${id}-hint`].filter(Boolean).join(' ');
  return (
    <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
      <label htmlFor={id} className={hideLabel ? 'r-hidden' : 'r-label'}>
        {label}
        {optional ? <span className="r-optional"> optional</span> : null}
      </label>
      {children({
        id,
        ...(describedBy && { 'aria-describedby': describedBy }),
        ...(error && { 'aria-invalid': true as const }),
      })}
      {error ? (
        <Text id={`${id}-error`} size={13} tone="oxide" style={{ marginTop: space.half }}>
          {error}
        </Text>
      ) : null}
      {hasHint ? (
        <View {...web({ id: `${id}-hint` })} style={{ marginTop: space.half }}>
          <Text size={13} tone="muted">
            {hint}
          </Text>
        </View>
      ) : null}
    </View>
  );
}
