/** Limits of the formula language; every one appears in the error that it causes. */
export const VARIABLES_LIMIT = 16;
export const PARAMETERS_LIMIT = 32;
export const DEFINITIONS_LIMIT = 64;
export const FORMULA_CHARACTERS_LIMIT = 8000;
export const SYSTEM_CHARACTERS_LIMIT = 64_000;
/** Nodes of one formula as typed. */
export const FORMULA_NODES_LIMIT = 5000;
export const NESTING_LIMIT = 100;
export const NAME_CHARACTERS_LIMIT = 32;
/** Characters of a typed number. */
export const NUMBER_CHARACTERS_LIMIT = 200;
/** Typed numbers are smaller than this. */
export const NUMBER_SIZE_LIMIT = 1e100;
