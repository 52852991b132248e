/** Stands on every page and in every export where orbits could be taken for something operational. */
export const CAUTION =
  'A numerical result of an idealised model. Nothing here is cleared for the operation of a vehicle, machine or plant; ' +
  'follow local codes and licensed practice.';

/** Licence under which contributors release entries. */
export const LICENCE = 'CC-BY-4.0';
