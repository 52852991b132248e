import { type Place, PlaceLink } from './place-link';

/** The places on a phone: a bar at the bottom. */
export function PlacesBar({ places }: { places: readonly Place[] }) {
  return (
    <nav className="r-places" aria-label="Places">
      {places.map((place) => (
        <PlaceLink key={place.href} place={place} />
      ))}
    </nav>
  );
}
