/** The page of an entry; a search comes along, so that the page can lead back and to its neighbours. */
export function entryHref(accession: string, search?: { text: string; sort: string }): string {
  const path = `/orbits/${encodeURIComponent(accession)}`;
  if (!search?.text) return path;
  const query = new URLSearchParams({ q: search.text, ...(search.sort && { sort: search.sort }) });
  return `${path}?${query.toString()}`;
}

/** The catalogue under a search. */
export function searchHref(text: string, sort = ''): string {
  const query = new URLSearchParams({ ...(text && { q: text }), ...(sort && { sort }) }).toString();
  return query ? `/?${query}` : '/';
}

/** Address of a submission's page. */
export const submissionHref = (id: string): string => `/desk/${encodeURIComponent(id)}`;
