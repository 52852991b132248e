import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { takeStartLock } from '@/server/launch/start-lock';

let folder: string;
beforeEach(() => void (folder = mkdtempSync(join(tmpdir(), 'ritornel-lock-'))));
afterEach(() => rmSync(folder, { recursive: true }));

describe('takeStartLock', () => {
  it('refuses a second start of the same folder and names the first', async () => {
    const lock = await takeStartLock(folder);
    lock.note(4321);
    await expect(takeStartLock(folder)).rejects.toThrow(new RegExp(`process ${process.pid}, port 4321.*STATE_FOLDER`));
    lock.release();
  });

  it('lets the next one in after a release, which leaves no trace', async () => {
    (await takeStartLock(folder)).release();
    const next = await takeStartLock(folder);
    expect(next.earlier).toBeNull();
    next.release();
  });

  it('is not held up by the note of a start that was killed, and passes it on', async () => {
    writeFileSync(join(folder, 'start.json'), '{"pid":1,"port":4170}');
    const lock = await takeStartLock(folder);
    expect(lock.earlier).toEqual({ pid: 1, port: 4170 });
    lock.release();
  });

  it('keeps folders apart', async () => {
    const other = mkdtempSync(join(tmpdir(), 'ritornel-lock-'));
    const locks = [await takeStartLock(folder), await takeStartLock(other)];
    for (const lock of locks) lock.release();
    rmSync(other, { recursive: true });
  });
});
