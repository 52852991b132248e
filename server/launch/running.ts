import type { Cluster } from '@/server/cluster/start-cluster';
import type { KeptChild } from '@/server/launch/child-process';
import type { StartLock } from '@/server/launch/start-lock';

/** Everything that a start has started, and how it ends. */
export class Running {
  readonly children: KeptChild[] = [];
  cluster: Cluster | null = null;
  lock: StartLock | null = null;

  private readonly over = new AbortController();
  private ending: Promise<void> | null = null;

  /** Aborted as soon as the end begins. */
  get signal(): AbortSignal {
    return this.over.signal;
  }

  /** End the processes, then the database, then let go of the folder. A second call waits for the first. */
  end(): Promise<void> {
    this.over.abort();
    return (this.ending ??= this.endInOrder());
  }

  /** For whoever can't wait: the processes are gone at once, the database still ends in order. */
  hurry(): void {
    for (const child of this.children) child.kill();
  }

  private async endInOrder(): Promise<void> {
    await Promise.all(this.children.map((child) => child.stop()));
    await this.cluster?.stop();
    this.lock?.release();
  }
}
