import type { ReactNode } from 'react';
import { DraftField } from '@/features/catalogue/draft-field';
import { Italic } from '@/features/catalogue/italic';
import { mathName } from '@/features/notation/math-name';

const NUMBER = String.raw`[+\-−]?(?:\d+(?:\.\d*)?|\.\d+)`;
const POINT = new RegExp(String.raw`^${NUMBER}(?:\s*,\s*${NUMBER})*$`);

interface PointFieldProps {
  title: (words: ReactNode) => ReactNode;
  value: string;
  /** Names of the chosen system's variables; null without a system, which a point needs. */
  variables: readonly string[] | null;
  onCommit: (value: string) => void;
}

/** Coordinates of a point: the result is sorted by the distance of the nearest crossing. */
export function PointField({ title, value, variables, onCommit }: PointFieldProps) {
  const count = variables?.length ?? 0;
  const form = variables === null ? POINT : new RegExp(String.raw`^${NUMBER}(?:\s*,\s*${NUMBER}){${count - 1}}$`);
  return (
    <DraftField
      label={title(variables ? <Names variables={variables} /> : 'Near a point')}
      showLabel
      letters
      placeholder={placeholderFor(variables)}
      value={value}
      form={form}
      wrong={variables === null ? 'a system and its coordinates' : `${count} numbers with commas between`}
      onCommit={onCommit}
    />
  );
}

function Names({ variables }: { variables: readonly string[] }) {
  return (
    <>
      Near a point: <Italic>{variables.map(mathName).join(', ')}</Italic>
    </>
  );
}

/** As many numbers as the system has variables. */
function placeholderFor(variables: readonly string[] | null): string {
  if (variables === null) return 'choose a system first';
  return `such as ${variables.map((_, index) => SOME[index % SOME.length]).join(', ')}`;
}

const SOME = ['−13.8', '−19.6', '27', '0.5'] as const;
