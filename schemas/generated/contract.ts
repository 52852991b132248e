// Written by schemas/generate.ts from schemas/*.schema.json: change those and run `npm run schemas`.

/**
 * What a check says.
 */
export type Verdict = 'closes' | 'closes-after-correction' | 'does-not-close' | 'inconclusive';
/**
 * stable: all multipliers inside the unit circle; saddle: some outside, others not; unstable: all outside; neutral: none outside, some on it; undecided.
 */
export type Stability = 'stable' | 'saddle' | 'unstable' | 'neutral' | 'undecided';
/**
 * What a check found.
 */
export type FindingCode =
  | 'already-known'
  | 'orbit-nearby'
  | 'stiff'
  | 'near-tangent-crossing'
  | 'itinerary-differs'
  | 'invariant-drifts'
  | 'not-converged'
  | 'not-refined'
  | 'point-off-section'
  | 'wrong-crossing-direction'
  | 'tangent-crossing'
  | 'no-return'
  | 'returns-differ'
  | 'return-times-differ'
  | 'multipliers-differ'
  | 'period-is-multiple'
  | 'equilibrium'
  | 'escapes'
  | 'singularity'
  | 'too-few-digits'
  | 'self-check-failed'
  | 'too-long';
/**
 * A number as a person types it: `[+-]digits[.digits][e[+-]digits]` or `p/q` of integers, at most 200 characters, below 1e100 in size (the size is tested after parsing). JSON numbers are accepted too.
 */
export type TypedNumber = string | number;
/**
 * A section: a name of the system's, a formula, or a plane.
 */
export type SectionChoice =
  | string
  | {
      /**
       * u
       */
      formula: string;
    }
  | {
      plane: {
        /**
         * @minItems 1
         * @maxItems 16
         */
        normal: TypedNumber[];
        /**
         * @minItems 1
         * @maxItems 16
         */
        through: TypedNumber[];
      };
    };
/**
 * Where the machine stands with a check.
 */
export type CheckState = 'none' | 'queued' | 'running' | 'done' | 'failed' | 'stale';
/**
 * Why a submission was returned or declined.
 */
export type ReasonCode =
  | 'does-not-close'
  | 'not-transverse'
  | 'already-known'
  | 'not-prime'
  | 'wrong-system-or-parameters'
  | 'out-of-scope'
  | 'description-lacking';
/**
 * Where people stand with a submission.
 */
export type ReviewState = 'draft' | 'submitted' | 'in-review' | 'accepted' | 'returned' | 'declined' | 'withdrawn';
/**
 * Each includes the former.
 */
export type Role = 'reader' | 'contributor' | 'curator' | 'administrator';

export interface Contract {
  AcceptedAnswer: AcceptedAnswer;
  CheckReport: CheckReport;
  CheckRequest: CheckRequest;
  CheckState: CheckState;
  Check: Check;
  CheckedOrbit: CheckedOrbit;
  ClaimRequest: ClaimRequest;
  CommentRequest: CommentRequest;
  Comment: Comment;
  Confirmation: Confirmation;
  Decision: Decision;
  DraftBody: DraftBody;
  EntryExport: EntryExport;
  EntryImage: EntryImage;
  EntryRevision: EntryRevision;
  Entry: Entry;
  ExportEnd: ExportEnd;
  FindingCode: FindingCode;
  Finding: Finding;
  KnownByReturns: KnownByReturns;
  OrbitMatch: OrbitMatch;
  OrbitPage: OrbitPage;
  PasswordForgot: PasswordForgot;
  PasswordReset: PasswordReset;
  Problem: Problem;
  ReasonCode: ReasonCode;
  Reference: Reference;
  RefinementObstacle: RefinementObstacle;
  RefinementRequest: RefinementRequest;
  Refinement: Refinement;
  Registration: Registration;
  ReleaseList: ReleaseList;
  ReleaseRequest: ReleaseRequest;
  Release: Release;
  ReviewState: ReviewState;
  Role: Role;
  SectionChoice: SectionChoice;
  Section: Section;
  SessionChange: SessionChange;
  Session: Session;
  SignIn: SignIn;
  Stability: Stability;
  SubmissionBody: SubmissionBody;
  SubmissionChange: SubmissionChange;
  SubmissionCreate: SubmissionCreate;
  SubmissionEvent: SubmissionEvent;
  SubmissionPage: SubmissionPage;
  SubmissionSummary: SubmissionSummary;
  Submission: Submission;
  SystemDocument: SystemDocument;
  SystemList: SystemList;
  System: System;
  Trace: Trace;
  TypedNumber: TypedNumber;
  UserChange: UserChange;
  UserPage: UserPage;
  User: User;
  Verdict: Verdict;
  WithdrawalRequest: WithdrawalRequest;
}
/**
 * The request was taken; says nothing about what is known.
 */
export interface AcceptedAnswer {
  message: string;
}
/**
 * The immutable result of a check.
 */
export interface CheckReport {
  verdict: Verdict;
  closure: {
    /**
     * largest difference of a coordinate
     */
    absolute: number;
    /**
     * in sizes of the extents
     */
    relative: number;
    tolerance: number;
  } | null;
  correction: {
    iterations: number;
    /**
     * of the point, in sizes of the extents
     */
    shift: number;
    periodShift: number;
    residual: number;
    segments: number;
    /**
     * what was held fixed
     */
    held: string;
    /**
     * directions in which the orbit belongs to a family
     */
    freeDirections: number;
    /**
     * second Newton correction over the first: below 0.25 the start is well inside the basin; null where the first was rounding
     */
    basinRatio: number | null;
  } | null;
  orbit: CheckedOrbit | null;
  findings: Finding[];
  matches: OrbitMatch[];
  digits: {
    typed: number;
    confirmed: number;
  } | null;
  /**
   * raw closure that the digits as typed let expect
   */
  expectedClosure: number | null;
  endPoint: string[] | null;
  suggestion: {
    /**
     * member of the body
     */
    field: string;
    value: string | string[] | number;
    verdict: Verdict;
  } | null;
  engine: {
    version: string;
    steps: number;
    cpuMs: number;
  };
}
/**
 * The orbit that the check found, corrected.
 */
export interface CheckedOrbit {
  point: string[];
  /**
   * a decimal number
   */
  period: string;
  returns: number;
  prime: boolean;
  crossings: {
    /**
     * since the start
     */
    time: string;
    point: string[];
    /**
     * since the crossing before
     */
    returnTime: string;
    /**
     * cosine between grad u and f, coordinates divided by the extents
     */
    transversality: number;
  }[];
  /**
   * n − 1, largest modulus first, without the trivial one
   */
  multipliers: {
    /**
     * a decimal number
     */
    re: string;
    /**
     * a decimal number
     */
    im: string;
  }[];
  /**
   * how many equal 1, the trivial one included
   */
  unitMultipliers: number;
  /**
   * log|multiplier|/T
   */
  exponents: number[];
  selfCheck: {
    /**
     * ‖M f − f‖/(‖M‖‖f‖)
     */
    flow: number;
    /**
     * difference of Σ log|multiplier| from the integral of the divergence
     */
    liouville: number | null;
    /**
     * largest |log|multiplier| + log|partner|| of reciprocal pairs; null where the flow is neither Hamiltonian nor the orbit reversible
     */
    pairing: number | null;
  };
  stability: Stability;
  unstableDirections: number;
  /**
   * smallest rotation
   */
  itinerary: string | null;
  smallestTransversality: number;
  extent: number[][];
  invariants: {
    name: string;
    /**
     * a decimal number
     */
    value: string;
    drift: number;
  }[];
  /**
   * turns of each angle, null for other coordinates
   */
  winding: (number | null)[] | null;
}
/**
 * One line of a check report.
 */
export interface Finding {
  code: FindingCode;
  severity: 'blocker' | 'warning' | 'note';
  /**
   * a plain sentence with its figures
   */
  message: string;
  value: number | null;
  limit: number | null;
}
/**
 * An entry that the check recognised.
 */
export interface OrbitMatch {
  accession: string;
  relation: 'same' | 'same-other-start' | 'symmetric-image' | 'multiple-of';
  distance: number;
  rotation: number;
  lettersDiffering: number | null;
  symmetry: string | null;
}
/**
 * An orbit to check without submitting it; `system` may be a whole document.
 */
export interface CheckRequest {
  system: string | SystemDocument;
  /**
   * values that differ from the system's defaults
   */
  parameters?: {
    [k: string]: TypedNumber;
  };
  section: SectionChoice;
  /**
   * the start, on the section, in the system's order of variables
   *
   * @minItems 1
   * @maxItems 16
   */
  point: TypedNumber[];
  /**
   * section points of the returns but the last, in order of time: for orbits so unstable that one point does not identify them
   *
   * @maxItems 4999
   */
  points?: TypedNumber[][];
  /**
   * in a family: the variable or invariant that keeps its value while the rest is corrected
   */
  hold?: string;
  /**
   * counted crossings with 0 < t ≤ T
   */
  returns?: number;
  period: TypedNumber;
  /**
   * @minItems 1
   * @maxItems 5000
   */
  returnTimes?: TypedNumber[];
  /**
   * one letter per return
   */
  itinerary?: string;
  tolerance?: TypedNumber;
  /**
   * claims, largest first, compared to the digits typed
   *
   * @maxItems 16
   */
  multipliers?: (
    | TypedNumber
    | {
        re: TypedNumber;
        im: TypedNumber;
      }
  )[];
  /**
   * correct digits asked for; with an account only
   */
  digits?: number;
  /**
   * @maxItems 50
   */
  references?: Reference[];
  note?: string;
}
/**
 * A system of ordinary differential equations x' = f(x; p) as people state it. Inline in a check only name, variables, parameters and equations are needed.
 */
export interface SystemDocument {
  /**
   * title
   */
  name: string;
  /**
   * @minItems 1
   * @maxItems 16
   */
  variables: {
    /**
     * a letter, then letters, digits or underscores
     */
    name: string;
    /**
     * an angle's modulus, such as 2*pi
     */
    modulus?: string;
  }[];
  /**
   * @maxItems 32
   */
  parameters: {
    /**
     * a letter, then letters, digits or underscores
     */
    name: string;
    value: TypedNumber;
    /**
     * what it stands for
     */
    description?: string;
  }[];
  /**
   * variable → right-hand side
   */
  equations: {
    [k: string]: string;
  };
  /**
   * @maxItems 64
   */
  definitions?: {
    /**
     * a letter, then letters, digits or underscores
     */
    name: string;
    /**
     * may use earlier definitions
     */
    formula: string;
  }[];
  /**
   * @maxItems 16
   */
  invariants?: {
    /**
     * name
     */
    name: string;
    /**
     * constant along the flow
     */
    formula: string;
  }[];
  /**
   * @maxItems 16
   */
  symmetries?: {
    /**
     * name
     */
    name: string;
    map: {
      [k: string]: string;
    };
    reversesTime: boolean;
  }[];
  /**
   * @maxItems 16
   */
  sections?: {
    /**
     * name
     */
    name: string;
    /**
     * u; a crossing counts where it increases through zero
     */
    formula: string;
    description?: string;
    /**
     * @maxItems 36
     */
    letters?: {
      /**
       * one character
       */
      letter: string;
      /**
       * the letter holds at a crossing where this is positive
       */
      where: string;
    }[];
    incipit?: {
      /**
       * a letter, then letters, digits or underscores
       */
      coordinate: string;
      /**
       * the five staff levels, highest first, in units of the coordinate
       *
       * @minItems 5
       * @maxItems 5
       */
      levels: number[];
    };
  }[];
  /**
   * @maxItems 16
   */
  counts?: {
    /**
     * a section's name
     */
    section: string;
    parameters: {
      [k: string]: TypedNumber;
    };
    /**
     * number of returns → orbits that the symbolic dynamics allows
     */
    allowedByReturns: {
      [k: string]: number;
    };
    /**
     * where the table comes from
     */
    source: string;
  }[];
  /**
   * the system's name in addresses
   */
  slug?: string;
  /**
   * one or two sentences
   */
  summary?: string;
  /**
   * @maxItems 50
   */
  references?: Reference[];
}
/**
 * A published source.
 */
export interface Reference {
  /**
   * authors, title, journal, year
   */
  citation: string;
  /**
   * DOI without resolver address
   */
  doi?: string;
}
/**
 * A check: its state and, once done, the report's members.
 */
export interface Check {
  /**
   * random, 128 bit
   */
  id: string;
  checkState: CheckState;
  body: CheckRequest;
  progress: {
    phase: 'integrating' | 'correcting' | 'multipliers' | 'comparing';
    time: number;
    period: number;
    returns: number;
  } | null;
  failure: {
    message: string;
    attempts: number;
  } | null;
  createdAt: string;
  verdict: Verdict | null;
  closure: {
    /**
     * largest difference of a coordinate
     */
    absolute: number;
    /**
     * in sizes of the extents
     */
    relative: number;
    tolerance: number;
  } | null;
  correction: {
    iterations: number;
    /**
     * of the point, in sizes of the extents
     */
    shift: number;
    periodShift: number;
    residual: number;
    segments: number;
    /**
     * what was held fixed
     */
    held: string;
    /**
     * directions in which the orbit belongs to a family
     */
    freeDirections: number;
    /**
     * second Newton correction over the first: below 0.25 the start is well inside the basin; null where the first was rounding
     */
    basinRatio: number | null;
  } | null;
  orbit: CheckedOrbit | null;
  findings: Finding[] | null;
  matches: OrbitMatch[] | null;
  digits: {
    typed: number;
    confirmed: number;
  } | null;
  /**
   * raw closure that the digits as typed let expect
   */
  expectedClosure: number | null;
  endPoint: string[] | null;
  suggestion: {
    /**
     * member of the body
     */
    field: string;
    value: string | string[] | number;
    verdict: Verdict;
  } | null;
  engine: {
    version: string;
    steps: number;
    cpuMs: number;
  } | null;
}
/**
 * Claim a submission; `takeOver` takes it from another curator.
 */
export interface ClaimRequest {
  takeOver?: boolean;
}
/**
 * A comment.
 */
export interface CommentRequest {
  text: string;
}
/**
 * One comment on a submission.
 */
export interface Comment {
  id: string;
  at: string;
  who: string;
  revision: number;
  text: string;
}
/**
 * Confirm an e-mail address.
 */
export interface Confirmation {
  token: string;
}
/**
 * A curator's decision.
 */
export interface Decision {
  decision: 'accept' | 'return' | 'decline';
  reason?: ReasonCode;
  comment?: string;
}
/**
 * A submission's body while it is being typed: any member may be missing or unfinished; kept exactly as typed.
 */
export interface DraftBody {
  [k: string]: unknown;
}
/**
 * A whole search result as one document.
 */
export interface EntryExport {
  caution: string;
  items: Entry[];
  total: number;
}
/**
 * An entry of the catalogue.
 */
export interface Entry {
  accession: string;
  revision: number;
  status: 'accepted' | 'withdrawn';
  system: {
    slug: string;
    version: number;
    name: string;
  };
  parameters: {
    [k: string]: string;
  };
  section: Section;
  point: string[];
  returns: number;
  /**
   * a decimal number
   */
  period: string;
  returnTimes: string[];
  crossings: {
    /**
     * a decimal number
     */
    time: string;
    point: string[];
    transversality: number;
  }[];
  itinerary: string | null;
  multipliers: {
    /**
     * a decimal number
     */
    re: string;
    /**
     * a decimal number
     */
    im: string;
  }[];
  unitMultipliers: number;
  exponents: number[];
  stability: Stability;
  unstableDirections: number;
  smallestTransversality: number;
  extent: number[][];
  invariants: {
    name: string;
    /**
     * a decimal number
     */
    value: string;
  }[];
  closure: {
    /**
     * largest difference of a coordinate
     */
    absolute: number;
    /**
     * in sizes of the extents
     */
    relative: number;
    tolerance: number;
  };
  correction: {
    iterations: number;
    /**
     * of the point, in sizes of the extents
     */
    shift: number;
    periodShift: number;
    residual: number;
    segments: number;
    /**
     * what was held fixed
     */
    held: string;
    /**
     * directions in which the orbit belongs to a family
     */
    freeDirections: number;
    /**
     * second Newton correction over the first: below 0.25 the start is well inside the basin; null where the first was rounding
     */
    basinRatio: number | null;
  } | null;
  verdict: Verdict;
  findings: Finding[];
  evidence: {
    level: 're-integrated' | 'refined' | 'proved';
    digits: number;
    engine: string;
    /**
     * what the refinement held where the orbit belongs to a family; null where it is isolated or not refined
     */
    held: string | null;
    /**
     * why the last refinement that was tried gave no more digits; null where none failed
     */
    obstacle: RefinementObstacle | null;
  };
  submitted: SubmissionBody;
  contributor: {
    name: string;
    orcid: string | null;
  };
  curator: {
    name: string;
    orcid: string | null;
  };
  submittedAt: string;
  acceptedAt: string;
  references: Reference[];
  note: string | null;
  licence: string;
  withdrawal: {
    at: string;
    reason: string;
    replacement: string | null;
  } | null;
  caution: string;
  links: {
    self: string;
    page: string;
    trace: string;
    system: string;
  };
}
/**
 * The section of an entry.
 */
export interface Section {
  name: string | null;
  formula: string;
}
/**
 * Why an orbit could not be computed to the digits asked for.
 */
export interface RefinementObstacle {
  /**
   * digits that were asked for
   */
  digits: number;
  reason: 'not-closed' | 'not-converged' | 'too-long' | 'too-unstable' | 'out-of-domain' | 'withdrawn';
  /**
   * one sentence
   */
  message: string;
}
/**
 * One periodic orbit as a contributor states it.
 */
export interface SubmissionBody {
  /**
   * slug
   */
  system: string;
  /**
   * values that differ from the system's defaults
   */
  parameters?: {
    [k: string]: TypedNumber;
  };
  section: SectionChoice;
  /**
   * the start, on the section, in the system's order of variables
   *
   * @minItems 1
   * @maxItems 16
   */
  point: TypedNumber[];
  /**
   * section points of the returns but the last, in order of time: for orbits so unstable that one point does not identify them
   *
   * @maxItems 4999
   */
  points?: TypedNumber[][];
  /**
   * in a family: the variable or invariant that keeps its value while the rest is corrected
   */
  hold?: string;
  /**
   * counted crossings with 0 < t ≤ T
   */
  returns?: number;
  period: TypedNumber;
  /**
   * @minItems 1
   * @maxItems 5000
   */
  returnTimes?: TypedNumber[];
  /**
   * one letter per return
   */
  itinerary?: string;
  tolerance?: TypedNumber;
  /**
   * claims, largest first, compared to the digits typed
   *
   * @maxItems 16
   */
  multipliers?: (
    | TypedNumber
    | {
        re: TypedNumber;
        im: TypedNumber;
      }
  )[];
  /**
   * correct digits asked for; with an account only
   */
  digits?: number;
  /**
   * @maxItems 50
   */
  references?: Reference[];
  note?: string;
}
/**
 * An entry that is another's image under a symmetry of their system.
 */
export interface EntryImage {
  accession: string;
  /**
   * its name in the system's document
   */
  symmetry: string;
}
/**
 * One revision of an entry.
 */
export interface EntryRevision {
  revision: number;
  at: string;
  /**
   * who made it; null: the archive itself
   */
  by: string | null;
  why: string;
  evidence: {
    level: 're-integrated' | 'refined' | 'proved';
    digits: number;
  };
  links: {
    /**
     * the entry as it was in this revision
     */
    self: string;
  };
}
/**
 * Last line of an NDJSON export.
 */
export interface ExportEnd {
  end: true;
  count: number;
  /**
   * of all bytes before this line
   */
  sha256: string;
}
/**
 * Entries by number of returns for one set of parameters.
 */
export interface KnownByReturns {
  section: string;
  parameters: {
    [k: string]: string;
  };
  /**
   * all entries with these parameters and this section
   */
  known: number;
  rows: {
    returns: number;
    known: number;
    allowed: number | null;
  }[];
  source: string | null;
}
/**
 * One page of a search.
 */
export interface OrbitPage {
  items: Entry[];
  /**
   * cursor for `after`
   */
  next: string | null;
  total: {
    value: number;
    relation: 'exact' | 'at-least';
  };
  /**
   * how many are left when entries that are each other's images count once; null where none are, and without a system
   */
  upToSymmetry: {
    value: number;
    /**
     * names of the symmetries that map results onto each other
     */
    symmetries: string[];
  } | null;
  /**
   * with include=incipit: accession → the drawn coordinate along the flow as [time, value] pairs
   */
  incipits: {
    [k: string]: number[][];
  } | null;
  /**
   * with near: accession → distance of the nearest crossing
   */
  distances: {
    [k: string]: number;
  } | null;
}
/**
 * Ask for a link to set a new password.
 */
export interface PasswordForgot {
  email: string;
}
/**
 * Set a new password.
 */
export interface PasswordReset {
  token: string;
  /**
   * 12 characters or more, at most 72 bytes in UTF-8 (tested by the server)
   */
  password: string;
}
/**
 * RFC 9457 problem details.
 */
export interface Problem {
  type: string;
  title: string;
  status: number;
  detail: string;
  /**
   * stable, kebab-case
   */
  code: string;
  /**
   * request id
   */
  instance: string | null;
  errors: {
    /**
     * JSON Pointer into the body, or a query parameter as #name
     */
    pointer: string;
    message: string;
    /**
     * 1-based character of a formula
     */
    position: number | null;
  }[];
  meanwhile: {
    reviewState: ReviewState;
    revision: number;
    etag: string;
    events: SubmissionEvent[];
  } | null;
}
/**
 * One change of a submission.
 */
export interface SubmissionEvent {
  id: number;
  at: string;
  /**
   * name; null for the machine
   */
  who: string | null;
  kind: string;
  from: ReviewState | null;
  to: ReviewState | null;
  revision: number;
  /**
   * id of the check
   */
  report: string | null;
  reason: ReasonCode | null;
  comment: string | null;
}
/**
 * Compute an entry's point, period and return times to more digits than doubles hold.
 */
export interface RefinementRequest {
  /**
   * correct digits asked for
   */
  digits: number;
}
/**
 * The computation of an entry to many digits: waiting, running, or done with a revision or with the reason why there is none.
 */
export interface Refinement {
  id: string;
  accession: string;
  /**
   * correct digits asked for
   */
  digits: number;
  /**
   * `failed` is a crash of the machinery; an orbit that has no more digits is `done` with an obstacle
   */
  state: 'queued' | 'running' | 'done' | 'failed';
  /**
   * whether the archive asked by itself, as it does for every accepted entry
   */
  askedBySystem: boolean;
  /**
   * the revision that has these digits
   */
  revision: number | null;
  obstacle: RefinementObstacle | null;
  /**
   * what happened, where the machinery broke
   */
  failure: string | null;
  computeMs: number;
  createdAt: string;
  finishedAt: string | null;
  links: {
    self: string;
    entry: string;
  };
}
/**
 * A new account.
 */
export interface Registration {
  name: string;
  email: string;
  /**
   * 12 characters or more, at most 72 bytes in UTF-8 (tested by the server)
   */
  password: string;
  orcid?: string;
}
/**
 * All releases, the newest first.
 */
export interface ReleaseList {
  items: Release[];
}
/**
 * A dated copy of the whole catalogue that never changes.
 */
export interface Release {
  id: number;
  /**
   * `cutting` until its files are written
   */
  state: 'cutting' | 'ready' | 'failed';
  note: string;
  cutBy: string;
  askedAt: string;
  cutAt: string | null;
  /**
   * the release that the changes are counted from
   */
  previous: number | null;
  entries: number | null;
  /**
   * since the release before
   */
  changes: {
    added: number;
    revised: number;
    withdrawn: number;
  } | null;
  files: ReleaseFile[];
  /**
   * one sentence; null until it is ready
   */
  citation: string | null;
  licence: string;
  caution: string;
  /**
   * why it could not be cut
   */
  failure: string | null;
  links: {
    self: string;
    page: string;
  };
}
export interface ReleaseFile {
  name: string;
  mediaType: string;
  bytes: number;
  sha256: string;
  href: string;
}
/**
 * Cut a release.
 */
export interface ReleaseRequest {
  /**
   * what readers should know of it
   */
  note?: string;
}
/**
 * Change what one has chosen for oneself.
 */
export interface SessionChange {
  /**
   * the daily mail about new submissions
   */
  digest: boolean;
}
/**
 * Who am I.
 */
export interface Session {
  user: User | null;
  /**
   * what waits for this person on the Desk
   */
  waiting: number;
  /**
   * whether this person gets the daily mail about new submissions; null for those who are no curator
   */
  digest: boolean | null;
  /**
   * the outbox is readable on this server
   */
  development: boolean;
}
/**
 * An account.
 */
export interface User {
  id: string;
  name: string;
  email: string;
  orcid: string | null;
  role: Role;
  confirmed: boolean;
  createdAt: string;
}
/**
 * Sign in.
 */
export interface SignIn {
  email: string;
  password: string;
}
/**
 * New content of a draft or a returned submission: the whole body.
 */
export interface SubmissionChange {
  [k: string]: unknown;
}
/**
 * A new draft, sent at once with `send`: the members of a submission body (unfinished ones are allowed while it stays a draft) and the flag.
 */
export interface SubmissionCreate {
  send?: boolean;
  [k: string]: unknown;
}
/**
 * Submissions.
 */
export interface SubmissionPage {
  items: SubmissionSummary[];
  /**
   * cursor for `after`
   */
  next: string | null;
  total: {
    value: number;
    relation: 'exact' | 'at-least';
  };
  turns: {
    curator: number;
    contributor: number;
    machine: number;
  };
}
/**
 * A submission in a list.
 */
export interface SubmissionSummary {
  id: string;
  /**
   * shown to people
   */
  number: number;
  revision: number;
  reviewState: ReviewState;
  checkState: CheckState;
  turn: ('curator' | 'contributor' | 'machine') | null;
  verdict: Verdict | null;
  report: CheckReport | null;
  /**
   * the report is of this revision by the current engine and system version
   */
  reportIsCurrent: boolean;
  /**
   * id of the check of this revision
   */
  check: string | null;
  failure: {
    message: string;
    attempts: number;
  } | null;
  progress: {
    phase: 'integrating' | 'correcting' | 'multipliers' | 'comparing';
    time: number;
    period: number;
    returns: number;
  } | null;
  body: DraftBody;
  owner: {
    id: string;
    name: string;
  };
  isMine: boolean;
  claim: {
    by: string;
    byMe: boolean;
    until: string;
  } | null;
  /**
   * a blocker keeps it from the review queue
   */
  blocked: boolean;
  decision: {
    decision: 'accept' | 'return' | 'decline';
    reason: ReasonCode | null;
    comment: string | null;
    by: string;
    at: string;
  } | null;
  accession: string | null;
  createdAt: string;
  sentAt: string | null;
  updatedAt: string;
}
/**
 * A submission.
 */
export interface Submission {
  id: string;
  /**
   * shown to people
   */
  number: number;
  revision: number;
  reviewState: ReviewState;
  checkState: CheckState;
  turn: ('curator' | 'contributor' | 'machine') | null;
  verdict: Verdict | null;
  report: CheckReport | null;
  /**
   * the report is of this revision by the current engine and system version
   */
  reportIsCurrent: boolean;
  /**
   * id of the check of this revision
   */
  check: string | null;
  failure: {
    message: string;
    attempts: number;
  } | null;
  progress: {
    phase: 'integrating' | 'correcting' | 'multipliers' | 'comparing';
    time: number;
    period: number;
    returns: number;
  } | null;
  body: DraftBody;
  owner: {
    id: string;
    name: string;
  };
  isMine: boolean;
  claim: {
    by: string;
    byMe: boolean;
    until: string;
  } | null;
  /**
   * a blocker keeps it from the review queue
   */
  blocked: boolean;
  decision: {
    decision: 'accept' | 'return' | 'decline';
    reason: ReasonCode | null;
    comment: string | null;
    by: string;
    at: string;
  } | null;
  accession: string | null;
  createdAt: string;
  sentAt: string | null;
  updatedAt: string;
  revisions: {
    revision: number;
    at: string;
    body: DraftBody;
    check: string | null;
  }[];
  events: SubmissionEvent[];
  comments: Comment[];
  links: {
    self: string;
  };
}
/**
 * All systems.
 */
export interface SystemList {
  items: System[];
}
/**
 * An accepted system with its counts.
 */
export interface System {
  /**
   * the system's name in addresses
   */
  slug: string;
  version: number;
  name: string;
  summary: string | null;
  acceptedAt: string;
  dimension: number;
  document: SystemDocument;
  /**
   * the equations, typeset
   */
  mathml: string;
  /**
   * the equations as plain text
   */
  text: string;
  /**
   * the divergence as a formula; null where it is no short polynomial
   */
  divergence: string | null;
  sections: {
    name: string;
    formula: string;
    description: string | null;
    mathml: string;
    letters: {
      letter: string;
      where: string;
    }[];
    incipit: {
      coordinate: string;
      /**
       * @minItems 5
       * @maxItems 5
       */
      levels: number[];
    };
    entries: number;
  }[];
  entries: number;
  /**
   * accession of the entry with the shortest period
   */
  shortest: string | null;
  knownByReturns: KnownByReturns[];
  links: {
    self: string;
    page: string;
    orbits: string;
  };
}
/**
 * The polyline to draw.
 */
export interface Trace {
  variables: string[];
  times: number[];
  points: number[][];
  crossings: {
    time: number;
    point: number[];
  }[];
  closes: boolean;
}
/**
 * Change an account's role.
 */
export interface UserChange {
  role: Role;
}
/**
 * Accounts.
 */
export interface UserPage {
  items: User[];
  /**
   * cursor for `after`
   */
  next: string | null;
  total: {
    value: number;
    relation: 'exact' | 'at-least';
  };
}
/**
 * Withdraw a submission.
 */
export interface WithdrawalRequest {
  comment?: string;
}
