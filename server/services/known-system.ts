import { QueryTypes, type Sequelize } from 'sequelize';
import type { SystemDocument } from '@/schemas/generated/contract';
import { invalidContent, unknownSystem } from '@/server/errors';
import { checkSystem } from '@/server/formulas/check-system';
import type { CheckedSystem } from '@/server/formulas/checked-system';

/** A system of the archive at one version, its formulas parsed. */
export interface KnownSystem {
  id: string;
  slug: string;
  version: number;
  checked: CheckedSystem;
}

/** Parsed systems are kept: versions never change. */
const parsed = new Map<string, CheckedSystem>();
const KEPT = 100;

interface VersionRow {
  id: string;
  slug: string;
  version: number;
  document: SystemDocument;
}

const byVersion = `select s.id, s.slug, v.version, v.document from system s join system_version v on v.system_id = s.id`;

/**
 * The current version of a system.
 *
 * @throws {Problem} `unknown-system` at `/system`.
 */
export async function knownSystem(db: Sequelize, slug: string): Promise<KnownSystem> {
  const [row] = await db.query<VersionRow>(
    `${byVersion} and v.version = s.current_version where s.slug = $1 and v.state = 'accepted'`,
    { bind: [slug], type: QueryTypes.SELECT },
  );
  if (!row) throw unknownSystem(slug);
  return parse(row);
}

/** One version of a system that is known to exist. */
export async function systemVersion(db: Sequelize, systemId: string, version: number): Promise<KnownSystem> {
  const [row] = await db.query<VersionRow>(`${byVersion} where s.id = $1 and v.version = $2`, {
    bind: [systemId, version],
    type: QueryTypes.SELECT,
  });
  if (!row) throw new RangeError(`there is no version ${version} of system ${systemId}`);
  return parse(row);
}

/**
 * Parse a system document that came inline.
 *
 * @throws {Problem} `invalid-content` with pointers below `/system`.
 */
export function inlineSystem(document: SystemDocument): CheckedSystem {
  const result = checkSystem(document, '/system');
  if (!result.ok) throw invalidContent(result.errors);
  return result.system;
}

function parse({ id, slug, version, document }: VersionRow): KnownSystem {
  const key = `${id} ${version}`;
  const kept = parsed.get(key);
  if (kept) return { id, slug, version, checked: kept };
  const result = checkSystem(document);
  if (!result.ok) {
    throw new Error(`version ${version} of ${slug} does not parse: ${result.errors[0]?.message ?? ''}`);
  }
  if (parsed.size >= KEPT) parsed.clear();
  parsed.set(key, result.system);
  return { id, slug, version, checked: result.system };
}
