import { randomBytes } from 'node:crypto';
import type { Sequelize, Transaction } from 'sequelize';
import type { CheckRequest } from '@/schemas/generated/contract';
import { OrbitCheck } from '@/server/models/orbit-check';
import type { Requester } from '@/server/services/allow-check';
import { PRIORITY, SECONDS_A_CHECK, SECONDS_A_CHECK_WITHOUT_ACCOUNT, TRIES } from '@/server/services/check-limits';

/** 128 bits: nobody guesses the id of a private check. */
const ID_BYTES = 16;

/** A check whose body has been validated. */
export interface ValidCheck {
  requester: Requester;
  body: CheckRequest;
  /** Null: the body holds the system. */
  system: { id: string; version: number } | null;
  /** The revision that it is about, for a check of a submission. */
  submission?: { id: string; revision: number };
}

/** Store a check and put it into the queue, both or neither. */
export async function enqueueCheck(db: Sequelize, valid: ValidCheck, transaction: Transaction): Promise<OrbitCheck> {
  const { requester, body, system, submission } = valid;
  const isAccount = 'accountId' in requester;
  const check = await OrbitCheck.create(
    {
      id: randomBytes(ID_BYTES).toString('base64url'),
      body,
      systemId: system?.id ?? null,
      systemVersion: system?.version ?? null,
      ownerId: isAccount ? requester.accountId : null,
      addressHash: isAccount ? null : requester.addressHash,
      submissionId: submission?.id ?? null,
      revision: submission?.revision ?? null,
      seconds: isAccount ? SECONDS_A_CHECK : SECONDS_A_CHECK_WITHOUT_ACCOUNT,
    },
    { transaction },
  );
  const priority = submission ? PRIORITY.submission : isAccount ? PRIORITY.check : PRIORITY.withoutAccount;
  await queueCheck(db, { id: check.id, priority }, transaction);
  return check;
}

/** Put the job of a stored check into the queue; while one waits there already it is not doubled. */
export async function queueCheck(
  db: Sequelize,
  { id, priority }: { id: string; priority: number },
  transaction: Transaction | null = null,
): Promise<void> {
  await db.query(
    `select graphile_worker.add_job('check-orbit', $1::json, max_attempts => $2, job_key => $3, priority => $4)`,
    { bind: [JSON.stringify({ check: id }), TRIES, id, priority], transaction },
  );
}
