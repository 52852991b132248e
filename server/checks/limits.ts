/** What a claim may ask for; each appears in the error that it causes. */
export const TOLERANCE_SMALLEST = 1e-13;
export const TOLERANCE_LARGEST = 1e-4;
export const TOLERANCE_DEFAULT = 1e-9;
export const RETURNS_LARGEST = 5000;

/** Steps of the integrator that one check may take. */
export const STEPS_DEFAULT = 200_000;
export const STEPS_LARGEST = 1_000_000;

/** |cosine| between flow and section below which a meeting is reported, and below which returns cannot be counted. */
export const NEAR_TANGENT = 1e-3;
export const TANGENT = 1e-6;

/** No counted crossing up to this share of the period means that the flow does not return. */
export const RETURN_WINDOW = 1.01;

/** Shifts within this many half-units of the last typed places come from too few digits. */
export const DIGITS_HALF_UNITS = 10;

/** Two orbits are the same when every crossing agrees within 10 tolerances, or this, in sizes. */
export const SAME_ORBIT = 1e-8;
export const SAME_ORBIT_TOLERANCES = 10;

/** Largest miss of M f = f, of Liouville's formula and of reciprocal pairs in a sound computation. */
export const SELF_CHECK_FLOW = 1e-8;
export const SELF_CHECK_LIOUVILLE = 1e-6;
export const SELF_CHECK_PAIRING = 1e-6;

/** Largest change of an invariant along the orbit, as a share of what it varies by over the orbit's sizes. */
export const INVARIANT_DRIFT = 1e-8;

/** Steps a return beyond which the field is called stiff. */
export const STIFF_STEPS = 5000;
