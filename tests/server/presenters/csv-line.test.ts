import Papa from 'papaparse';
import { csvLine } from '@/server/presenters/csv-line';

describe('csvLine', () => {
  it('ends with CR LF and quotes what needs it', () => {
    expect(csvLine(['a', 'b,c', 'd"e', 'f\ng', null, 2])).toBe('a,"b,c","d""e","f\ng",,2\r\n');
  });

  it.each(['=1+1', '+SUM(A1)', '-cmd', '@x', '\tx', '\rx'])('guards %j', (cell) => {
    expect(Papa.parse<string[]>(csvLine([cell])).data[0]?.[0]).toBe(`'${cell}`);
  });

  it.each(['-13.763610682134', '+1', '-1e-10', '1.5'])('leaves the number %s', (cell) => {
    expect(csvLine([cell])).toBe(`${cell}\r\n`);
  });
});
