import type { ReactNode } from 'react';

export interface FormProps {
  children: ReactNode;
  onSubmit: () => void;
  name: string;
}

/** A real form: Enter sends it. */
export function Form({ children, onSubmit, name }: FormProps) {
  return (
    <form
      noValidate
      aria-label={name}
      onSubmit={(event) => {
        event.preventDefault();
        onSubmit();
      }}
    >
      {children}
    </form>
  );
}
