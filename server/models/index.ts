import type { Sequelize } from 'sequelize';
import { CheckReport } from '@/server/models/check-report';
import { Comment } from '@/server/models/comment';
import { Crossing } from '@/server/models/crossing';
import { Event } from '@/server/models/event';
import { Orbit } from '@/server/models/orbit';
import { OrbitCheck } from '@/server/models/orbit-check';
import { OrbitRevision } from '@/server/models/orbit-revision';
import { Reference } from '@/server/models/reference';
import { Refinement } from '@/server/models/refinement';
import { Section } from '@/server/models/section';
import { Submission } from '@/server/models/submission';
import { SubmissionRevision } from '@/server/models/submission-revision';
import { System } from '@/server/models/system';
import { SystemVersion } from '@/server/models/system-version';
import { User } from '@/server/models/user';

/** Define every model on a connection, once a process. */
export function defineModels(db: Sequelize): void {
  User.define(db);
  System.define(db);
  SystemVersion.define(db);
  Section.define(db);
  Submission.define(db);
  SubmissionRevision.define(db);
  OrbitCheck.define(db);
  CheckReport.define(db);
  Event.define(db);
  Comment.define(db);
  Orbit.define(db);
  OrbitRevision.define(db);
  Reference.define(db);
  Crossing.define(db);
  Refinement.define(db);
}
