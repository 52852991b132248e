import { readPasted } from '@/features/checking/read-pasted';

const body = { system: 'lorenz', section: 'z-27', point: ['1', '2', '27'], period: '1.5', returns: 2 };

describe('readPasted', () => {
  it('takes a body with every digit as text', () => {
    expect(readPasted(` ${JSON.stringify(body)} `)).toEqual({ body, leftOut: [] });
  });

  it('takes what was submitted out of an entry', () => {
    expect(readPasted(JSON.stringify({ accession: 'RTN-0000001X', submitted: body }))).toEqual({ body, leftOut: [] });
  });

  it('takes the first line of an NDJSON export', () => {
    expect(readPasted(`${JSON.stringify(body)}\n{"end":true}`)?.body).toEqual(body);
  });

  it('takes a row with its header, and lists the columns that no orbit has', () => {
    const row = 'system,point.1,point.2,point.3,period,returns,parameters.rho,colour\nlorenz,1,"2",27,1.50,2,28,red';
    expect(readPasted(row)).toEqual({
      body: { system: 'lorenz', point: ['1', '2', '27'], period: '1.50', returns: 2, parameters: { rho: '28' } },
      leftOut: ['colour'],
    });
  });

  it('takes the digits that are wanted as a number, and not those that an entry’s row says are known', () => {
    const row = 'system,period,digits\nlorenz,1.5,60';
    expect(readPasted(row)?.body).toEqual({ system: 'lorenz', period: '1.5', digits: 60 });
    expect(readPasted('accession,system,period,digits\nRTN-0000001X,lorenz,1.5,30')).toEqual({
      body: { system: 'lorenz', period: '1.5' },
      leftOut: ['accession', 'digits'],
    });
  });

  it('takes the cells of a spreadsheet, which come with tabs', () => {
    expect(readPasted('system\tperiod\nlorenz\t1.5')?.body).toEqual({ system: 'lorenz', period: '1.5' });
  });

  it.each(['', 'hello', '{"period": ', '[1, 2]', '1,2,3'])('does not read %j as an orbit', (text) => {
    expect(readPasted(text)).toBeNull();
  });
});
