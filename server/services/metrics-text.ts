import { QueryTypes, type Sequelize } from 'sequelize';
import { DEAD_AFTER_SECONDS } from '@/server/services/worker-life';

type Sample = readonly [labels: string, value: number];

interface Metric {
  name: string;
  kind: 'gauge' | 'counter';
  help: string;
  samples: readonly Sample[];
}

/** Figures of this process and of the work in the database, in the text format that collectors of metrics read. */
export async function metricsText(db: Sequelize, requests: ReadonlyMap<string, number>): Promise<string> {
  const metrics: Metric[] = [
    gauge('process_uptime_seconds', 'Since this process began', [['', process.uptime()]]),
    gauge('process_resident_memory_bytes', 'Memory of this process', [['', process.memoryUsage.rss()]]),
    {
      name: 'ritornel_http_requests_total',
      kind: 'counter',
      help: 'Requests answered by this process, by class of status',
      samples: [...requests].sort().map(([status, count]) => [`{status="${status}"}`, count]),
    },
    gauge('ritornel_entries', 'Entries by status', await counted(db, 'status', 'orbit')),
    gauge('ritornel_submissions', 'Submissions by review state', await counted(db, 'review_state', 'submission')),
    gauge('ritornel_checks', 'Checks by state', await counted(db, 'state', 'orbit_check')),
    gauge('ritornel_jobs', 'Jobs in the queue by task', await counted(db, 'task_identifier', 'graphile_worker.jobs')),
    gauge(
      'ritornel_mails_waiting',
      'Mails that no mail server has taken yet',
      await counted(db, null, 'outgoing_mail where sent_at is null'),
    ),
    gauge(
      'ritornel_workers_alive',
      'Workers that gave a sign of life',
      await counted(db, null, `worker where beat_at > now() - make_interval(secs => ${DEAD_AFTER_SECONDS})`),
    ),
  ];
  return metrics.map(textOf).join('');
}

const gauge = (name: string, help: string, samples: readonly Sample[]): Metric => ({
  name,
  kind: 'gauge',
  help,
  samples,
});

async function counted(db: Sequelize, column: string | null, from: string): Promise<Sample[]> {
  const rows = await db.query<{ label: string | null; count: number }>(
    `select ${column ?? 'null'} as label, count(*)::integer as count from ${from} ${column ? 'group by 1 order by 1' : ''}`,
    { type: QueryTypes.SELECT },
  );
  return rows.map(({ label, count }) => [label === null ? '' : `{${column!}="${label}"}`, count]);
}

const textOf = ({ name, kind, help, samples }: Metric): string =>
  `# HELP ${name} ${help}\n# TYPE ${name} ${kind}\n${samples.map(([labels, value]) => `${name}${labels} ${value}\n`).join('')}`;
