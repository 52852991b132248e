import { formSlips } from '@/features/checking/form-slips';
import { bodyOfDraft, draftOfBody, emptyDraft } from '@/features/checking/orbit-draft';

const body = {
  system: 'lorenz',
  parameters: { rho: '28' },
  section: 'z-27',
  point: ['-13.763610682134', '8/3', '27'],
  returns: 2,
  period: '1.5586522107161747',
  returnTimes: ['0.7793261053580874', '0.7793261053580873'],
  itinerary: 'AB',
  tolerance: '1e-9',
  digits: 60,
  references: [{ citation: 'a source' }],
  multipliers: ['4.71'],
  note: 'a note',
};

describe('the form of an orbit', () => {
  it('gives back the body that it was filled with, members without a field too', () => {
    expect(bodyOfDraft(draftOfBody(body), ['z-27'])).toEqual(body);
  });

  it('sends any other text as a formula, and keeps a plane as it came', () => {
    expect(bodyOfDraft(draftOfBody({ section: { formula: 'z - 30' } }), ['z-27'])).toEqual({
      section: { formula: 'z - 30' },
    });
    const plane = { section: { plane: { normal: ['0', '1'], through: ['0', '0'] } } };
    expect(bodyOfDraft(draftOfBody(plane), [])).toEqual(plane);
  });

  it('leaves out what is empty, and sends returns as typed when they are no number', () => {
    expect(bodyOfDraft({ ...emptyDraft, point: ['', ''], returns: 'two' }, [])).toEqual({ returns: 'two' });
  });

  it('survives values of an unexpected kind', () => {
    expect(bodyOfDraft(draftOfBody({ point: [1.5, null], period: { a: 1 }, parameters: 'none' }), [])).toEqual({
      point: ['1.5', ''],
    });
  });
});

describe('formSlips', () => {
  it('finds nothing in an empty form', () => {
    expect(formSlips({ ...emptyDraft, point: ['', '', ''] })).toEqual({});
  });

  it('names what is no number and what is missing', () => {
    const slips = formSlips({
      ...emptyDraft,
      point: ['1', '', '1,5'],
      period: 'six',
      returns: '0',
      parameters: { rho: '1e' },
    });
    expect(Object.keys(slips).sort()).toEqual(['/parameters/rho', '/period', '/point/1', '/point/2', '/returns']);
  });

  it.each([
    ['14', true],
    ['15', false],
    ['99', false],
    ['100', false],
    ['101', true],
    ['1e2', true],
  ])('of %s digits says whether that is too few, too many or no number: %s', (digits, isSlip) => {
    expect('/digits' in formSlips({ ...emptyDraft, digits })).toBe(isSlip);
  });

  it.each(['-13.76', '8/3', '1e-9', '+2'])('takes %s as a number', (period) => {
    expect(formSlips({ ...emptyDraft, period })).toEqual({});
  });
});
