/** U+002D before a digit or a point becomes U+2212, the minus sign. */
export const minusSign = (text: string): string => text.replace(/-(?=[\d.])/g, '−');
