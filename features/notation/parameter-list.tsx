import { Fragment } from 'react';
import { Text } from '@/features/ui';
import { mathName } from './math-name';
import { minusSign } from './minus-sign';

export interface ParameterListProps {
  values: Record<string, string>;
  /** Between name and value; a space unless given. */
  equals?: boolean;
}

/** Parameters in a line of text: σ 10, ρ 28, β 8/3. */
export function ParameterList({ values, equals }: ParameterListProps) {
  return (
    <>
      {Object.entries(values).map(([name, value], index) => (
        <Fragment key={name}>
          {index > 0 ? ', ' : null}
          <Text nowrap>
            <Text italic>{mathName(name)}</Text>
            {equals ? ' = ' : ' '}
            {minusSign(value)}
          </Text>
        </Fragment>
      ))}
    </>
  );
}
