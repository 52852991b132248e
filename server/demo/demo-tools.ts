import type { Config } from '@/server/config';
import type { Log } from '@/server/log';
import type { CheckWatch } from '@/server/services/check-watch';
import type { Desk } from '@/server/services/desk';
import type { Tracer } from '@/server/services/tracer';

/** What putting the content in place works with. */
export interface InstallTools {
  config: Config;
  desk: Desk;
  tracer: Tracer;
  checks: CheckWatch;
  log: Log;
  /** Aborted when the process is to end; what is missing then is done by the next start. */
  signal: AbortSignal;
}
