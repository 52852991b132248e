/** A count with commas: `8,030`. */
export const formatCount = (count: number): string => String(count).replace(/\B(?=(\d{3})+$)/g, ',');
