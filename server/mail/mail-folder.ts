import { randomBytes } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

const SUFFIX = '.eml';
/** Mails kept; older ones go. */
const MAX_KEPT = 500;

/** A mail as it arrived: its name in the folder and the whole message. */
export interface KeptMail {
  id: string;
  raw: string;
}

/** Mails that the local sink received, one file each, readable by their owner only. Names sort by arrival. */
export class MailFolder {
  private readonly folder: string;

  constructor(stateFolder: string) {
    this.folder = join(stateFolder, 'outbox');
  }

  keep(raw: Buffer): string {
    mkdirSync(this.folder, { recursive: true, mode: 0o700 });
    const id = `${new Date().toISOString().replaceAll(/[^0-9TZ]/g, '')}-${randomBytes(6).toString('hex')}`;
    writeFileSync(join(this.folder, id + SUFFIX), raw, { mode: 0o600 });
    for (const old of this.names().slice(MAX_KEPT)) rmSync(join(this.folder, old), { force: true });
    return id;
  }

  /** The newest first. */
  list(): KeptMail[] {
    return this.names().map((name) => ({
      id: name.slice(0, -SUFFIX.length),
      raw: readFileSync(join(this.folder, name), 'utf8'),
    }));
  }

  private names(): string[] {
    try {
      return readdirSync(this.folder)
        .filter((name) => name.endsWith(SUFFIX))
        .sort()
        .reverse();
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return [];
      throw error;
    }
  }
}
