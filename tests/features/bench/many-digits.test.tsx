import { fireEvent, screen, waitFor } from '@testing-library/react';
import { BenchScreen } from '@/features/bench/bench-screen';
import type { Check } from '@/schemas/generated/contract';
import { checkAB, curator, sessionOf } from '../../support/desk-fixtures';
import { fakeArchive, renderScreen } from '../../support/fake-archive';
import { lorenzSystem, traceAB } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const PERIOD = '1.55865221071617472756787020921269607052848054899724393588952';
const X = '-13.7636106821342005250144010543616538641008648540923684535379';

const sixty: Check = {
  ...checkAB,
  orbit: { ...checkAB.orbit!, period: PERIOD, point: [X, '-19.5787519424517955388380414460951603454', '27'] },
  digits: { typed: 13, confirmed: 60 },
};

const answers = (user: typeof curator | null): Parameters<typeof fakeArchive>[0] => ({
  'GET /systems': { body: { items: [lorenzSystem] } },
  'GET /session': { body: sessionOf(user) },
  'POST /checks': { body: sixty },
  'GET /checks/c1': { body: sixty },
  'GET /checks/c1/trace': { body: traceAB },
});

const show = () => renderScreen(<BenchScreen system="lorenz" from={null} />);
/** The first test of a file waits for the modules of the page as well. */
const patience = { timeout: 10_000 };
const field = (label: string | RegExp) => screen.findByLabelText(label, {}, patience);
const type = async (label: string | RegExp, text: string) =>
  fireEvent.change(await field(label), { target: { value: text } });

jest.setTimeout(30_000);

beforeEach(() => {
  localStorage.clear();
  windowWidth(390);
});

describe('many digits on the Bench', () => {
  it('are asked for with the form, and shown and copied in full, on a phone too', async () => {
    const writeText = jest.fn().mockResolvedValue(undefined);
    Object.assign(navigator, { clipboard: { writeText } });
    const calls = fakeArchive(answers(curator));
    show();
    await type('x', '-13.7636');
    await type('y', '8/3');
    await type('z', '27');
    await type('Period T', '1.55860');
    await type(/Digits wanted/, '60');
    fireEvent.click(screen.getByRole('button', { name: 'Check this orbit' }));
    expect(await screen.findByRole('heading', { name: 'Computed to 60 digits' }, patience)).toBeTruthy();
    expect(calls.find(({ method }) => method === 'POST')?.body).toMatchObject({ digits: 60 });
    fireEvent.click(screen.getByRole('button', { name: 'Copy period' }));
    await waitFor(() => expect(writeText).toHaveBeenCalledWith(PERIOD));
    const page = screen.getByRole('main');
    expect(page.textContent).not.toContain(PERIOD.slice(-8));
    fireEvent.click(screen.getByRole('button', { name: 'Show all digits of the orbit' }));
    expect(page.textContent).toContain(PERIOD.slice(-8));
    expect(page.textContent).toContain(X.slice(-8));
  });

  it('are no visitor’s to ask for', async () => {
    fakeArchive(answers(null));
    show();
    expect(await field('Period T')).toBeTruthy();
    expect(screen.queryByLabelText(/Digits wanted/)).toBeNull();
  });
});
