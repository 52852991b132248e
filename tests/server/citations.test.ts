import { Cite } from '@citation-js/core';
import '@citation-js/plugin-bibtex';
import '@citation-js/plugin-csl';
import '@citation-js/plugin-ris';
import request from 'supertest';
import { loadLorenzOrbits } from '@/tests/reference/load-orbits';
import { addLorenzEntries, addSystem } from '../support/catalogue';
import { testApp, type TestApp } from '../support/test-app';

let t: TestApp;
beforeAll(async () => {
  t = await testApp();
  const systemId = await addSystem(t.dependencies.pool, 'lorenz');
  await addLorenzEntries(t.dependencies.pool, { systemId, orbits: loadLorenzOrbits().slice(0, 2) });
});
afterAll(() => t.close());

const FORMS = [
  { suffix: 'bib', media: 'application/x-bibtex' },
  { suffix: 'csl.json', media: 'application/vnd.citationstyles.csl+json' },
  { suffix: 'ris', media: 'application/x-research-info-systems' },
] as const;

/** One form of the first entry, by its suffix, as text whatever its type. */
async function fetched(suffix: string): Promise<string> {
  const res = await request(t.app)
    .get(`/api/v1/orbits/RTN-0000001X.${suffix}`)
    .buffer(true)
    .parse((message, done) => {
      const pieces: Buffer[] = [];
      message.on('data', (piece: Buffer) => pieces.push(piece));
      message.on('end', () => done(null, Buffer.concat(pieces).toString('utf8')));
    });
  expect(res.status).toBe(200);
  return res.body as string;
}

/** An independent library's reading of a citation, as CSL. */
async function readBack(suffix: string): Promise<Record<string, unknown>> {
  const { data } = new Cite(await fetched(suffix));
  expect(data).toHaveLength(1);
  return data[0]!;
}

const today = (): number[] => {
  const now = new Date();
  return [now.getUTCFullYear(), now.getUTCMonth() + 1, now.getUTCDate()];
};

async function rename(name: string): Promise<void> {
  const sql = 'update account set name = $1 where id = (select contributor_id from orbit where number = 1)';
  await t.dependencies.pool.query(sql, [name]);
}

describe('citing an entry', () => {
  it.each(FORMS)('answers .$suffix, and the same for Accept: $media', async ({ suffix, media }) => {
    const res = await request(t.app).get('/api/v1/orbits/RTN-0000001X').set('Accept', media).buffer(true);
    expect([res.status, res.type]).toEqual([200, media]);
    expect(res.headers['content-disposition']).toBe(`attachment; filename="RTN-0000001X.${suffix}"`);
    expect(res.headers['vary']).toContain('Accept');
  });

  it.each(FORMS)('is read back from .$suffix with title, author, date and address', async ({ suffix }) => {
    const item = await readBack(suffix);
    expect(item['title']).toBe('Periodic orbit RTN-0000001X of the system Lorenz (T = 1.558652210716…, 2 returns)');
    expect(JSON.stringify(item['author'])).toContain('Jana Nováková');
    expect(item['URL']).toMatch(/^https?:\/\/[^/]+\/orbits\/RTN-0000001X$/);
    const date = (item['issued'] as { 'date-parts': number[][] })['date-parts'][0]!;
    expect(today().slice(0, date.length)).toEqual(date);
    expect(date.length).toBeGreaterThanOrEqual(2);
    expect(JSON.stringify(item)).toContain('revision 1');
  });

  it.each(FORMS)('keeps a name with signs that mean something to .$suffix', async ({ suffix }) => {
    const name = 'Zoë de {la} Cruz & Søn_50% #1 ~^\\';
    await rename(name);
    const item = await readBack(suffix);
    const [author] = item['author'] as { literal?: string; family?: string }[];
    expect(author!.literal ?? author!.family).toBe(name);
  });

  it('does not let a line break in a name begin a field of its own', async () => {
    await rename('A\nER  - \nTY  - BOOK\u2028B');
    expect((await fetched('ris')).match(/^(TY|ER) {2}-/gm)).toHaveLength(2);
    await rename('Contributor P');
  });

  it('says it in one sentence', async () => {
    const text = await fetched('txt');
    expect(text).toMatch(/^Contributor P: Periodic orbit RTN-0000001X of the system Lorenz .*, revision 1 of .*\n$/);
  });

  it('says that an entry is withdrawn', async () => {
    await t.dependencies.pool.query(
      `update orbit set status = 'withdrawn', withdrawn_at = now(), withdrawal_reason = 'Another orbit' where number = 1`,
    );
    for (const { suffix } of FORMS) expect(await fetched(suffix)).toContain('revision 1, withdrawn');
  });
});
