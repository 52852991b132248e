/** Letters shown whole in rows and cards. */
const WHOLE = 12;

/** An itinerary for rows and cards: whole up to twelve letters, else the first eleven and "…". */
export const shortItinerary = (itinerary: string): string =>
  Array.from(itinerary).length <= WHOLE
    ? itinerary
    : `${Array.from(itinerary)
        .slice(0, WHOLE - 1)
        .join('')}…`;
