/** Text as it is searched: small letters without accents, so that "novak" finds "Novák". */
export const foldText = (text: string): string =>
  text
    .normalize('NFKD')
    .replaceAll(/\p{Mark}/gu, '')
    .toLowerCase();
