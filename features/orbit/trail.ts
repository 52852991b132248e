/** Where an entry was found: the way back, and its neighbours in the result. */
export interface Trail {
  href: string;
  label: string;
  detail: string;
  previous: string | null;
  next: string | null;
}
