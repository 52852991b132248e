import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import { OrbitScreen } from '@/features/orbit/orbit-screen';
import type { Entry, Refinement } from '@/schemas/generated/contract';
import { curator, sessionOf } from '../../support/desk-fixtures';
import { type FakeAnswer, fakeArchive, problem, renderScreen } from '../../support/fake-archive';
import { entryAB, lorenzSystem, pageOf, traceAB } from '../../support/lorenz-fixtures';
import { windowWidth } from '../../support/window-width';

const { accession } = entryAB;
const path = `/orbits/${accession}`;

/** T and x of the orbit AB to 60 digits. */
const SIXTY = {
  period: '1.55865221071617472756787020921269607052848054899724393588952',
  x: '-13.7636106821342005250144010543616538641008648540923684535379',
};

const refinedAB: Entry = {
  ...entryAB,
  revision: 3,
  period: SIXTY.period,
  point: [SIXTY.x, ...entryAB.point.slice(1)],
  evidence: { level: 'refined', digits: 60, engine: '1.0.0', held: null, obstacle: null },
};

const refinement = (change: Partial<Refinement> = {}): Refinement => ({
  id: 'r1',
  accession,
  digits: 60,
  state: 'queued',
  askedBySystem: false,
  revision: null,
  obstacle: null,
  failure: null,
  computeMs: 0,
  createdAt: '2026-03-16T10:00:00.000Z',
  finishedAt: null,
  links: { self: `/api/v1${path}/refinements/r1`, entry: `/api/v1${path}` },
  ...change,
});

type Answers = Parameters<typeof fakeArchive>[0];

const answers = (more: Answers = {}): Answers => ({
  [`GET ${path}`]: { body: entryAB },
  [`GET ${path}/trace`]: { body: traceAB },
  [`GET ${path}/revisions`]: { body: { items: [] } },
  [`GET ${path}/refinements`]: { body: { items: [] } },
  'GET /systems/lorenz': { body: lorenzSystem },
  'GET /orbits': { body: pageOf(entryAB) },
  'GET /session': { body: sessionOf(curator) },
  ...more,
});

const show = () => renderScreen(<OrbitScreen accession={accession} trail={null} />);
/** The first test of a file waits for the modules of the page as well. */
const patience = { timeout: 10_000 };
const button = (digits: number) => screen.findByRole('button', { name: `Refine to ${digits} digits` }, patience);

beforeEach(() => windowWidth(1440));

jest.setTimeout(30_000);

describe('more digits of an entry', () => {
  it('are asked for with one press, waited for, and shown once they are there', async () => {
    let entry: Entry = entryAB;
    let items: Refinement[] = [];
    const calls = fakeArchive(
      answers({
        [`GET ${path}`]: () => ({ body: entry }),
        [`GET ${path}/refinements`]: () => ({ body: { items } }),
        [`POST ${path}/refinements`]: () => {
          items = [refinement()];
          return { status: 202, body: items[0] };
        },
      }),
    );
    show();
    fireEvent.click(await button(60));
    expect(await screen.findByText(/60 digits wait for their turn/)).toBeTruthy();
    const posted = calls.find(({ method }) => method === 'POST');
    expect(posted?.body).toEqual({ digits: 60 });
    expect(posted?.headers['Idempotency-Key']).toBeTruthy();
    expect((await button(60)).getAttribute('aria-disabled')).toBe('true');
    expect((await button(100)).getAttribute('aria-disabled')).toBeNull();

    items = [refinement({ state: 'done', revision: 3 })];
    entry = refinedAB;
    await waitFor(() => expect(screen.queryByRole('button', { name: 'Refine to 60 digits' })).toBeNull(), patience);
    expect(screen.getByText(/to 60 digits\./)).toBeTruthy();
    expect(await button(100)).toBeTruthy();
  });

  it('are shown in part, in full when asked for, and copied in full', async () => {
    const writeText = jest.fn().mockResolvedValue(undefined);
    Object.assign(navigator, { clipboard: { writeText } });
    fakeArchive(answers({ [`GET ${path}`]: { body: refinedAB } }));
    show();
    fireEvent.click(await screen.findByRole('button', { name: 'Copy period' }));
    await waitFor(() => expect(writeText).toHaveBeenCalledWith(SIXTY.period));
    expect(screen.queryByText(/Paler/)).toBeNull();
    const page = screen.getByRole('main');
    const tail = SIXTY.period.slice(-9);
    expect(page.textContent).not.toContain(tail);
    fireEvent.click(screen.getByRole('button', { name: 'Show all digits of the period' }));
    expect(page.textContent).toContain(tail);
    expect(screen.getByText(/All 60 digits shown/)).toBeTruthy();
  });

  it('are not offered to visitors nor for an entry that was withdrawn', async () => {
    fakeArchive(answers({ 'GET /session': { body: sessionOf(null) } }));
    const { unmount } = show();
    expect(await screen.findByText(/15 digits confirmed/)).toBeTruthy();
    expect(screen.queryByRole('group', { name: 'More digits' })).toBeNull();
    unmount();
    const withdrawal = { at: '2026-04-03T08:00:00.000Z', reason: 'A repeat.', replacement: null };
    fakeArchive(answers({ [`GET ${path}`]: { body: { ...entryAB, status: 'withdrawn', withdrawal } } }));
    show();
    expect(await screen.findByText(/15 digits confirmed/)).toBeTruthy();
    expect(screen.queryByRole('group', { name: 'More digits' })).toBeNull();
  });

  it('say why they were not reached, and what a family holds', async () => {
    const message = 'The time for this computation was over before the digits were found.';
    const evidence: Entry['evidence'] = {
      ...refinedAB.evidence,
      digits: 30,
      held: 'x',
      obstacle: { digits: 100, reason: 'too-long', message },
    };
    fakeArchive(answers({ [`GET ${path}`]: { body: { ...refinedAB, evidence } } }));
    show();
    expect(await screen.findByText(/It is one of a family; what is held is x\./)).toBeTruthy();
    expect(screen.getByText(`100 digits were tried and not reached: the time${message.slice(8)}`)).toBeTruthy();
  });

  it('say what the archive answered when it refuses', async () => {
    const refusal: FakeAnswer = problem(429, 'too-many-checks', '8 of your checks and refinements wait or run.');
    fakeArchive(answers({ [`POST ${path}/refinements`]: refusal }));
    show();
    const group = within(await screen.findByRole('group', { name: 'More digits' }));
    fireEvent.click(group.getByRole('button', { name: 'Refine to 100 digits' }));
    expect((await screen.findByRole('alert')).textContent).toContain('8 of your checks and refinements wait or run.');
  });
});
