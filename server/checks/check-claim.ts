import { type CheckReport, type Finding } from '@/schemas/generated/contract';
import { type CheckProgress } from '@/server/checks/check-progress';
import { type Claim } from '@/server/checks/claim';
import { multiplierClaims, returnClaims } from '@/server/checks/claims';
import { correctedAsClosed, typedAsClosed } from '@/server/checks/closed-orbit';
import { closesLater, partOfPeriod } from '@/server/checks/closes-later';
import { convergence } from '@/server/checks/convergence';
import { correctClaim, type ClaimCorrection } from '@/server/checks/correct-claim';
import { decimalOf } from '@/server/checks/decimal-of';
import { digitsOf, expectedClosure, tooFewDigits } from '@/server/checks/digits';
import { equilibrium } from '@/server/checks/equilibrium';
import { invariantDrift } from '@/server/checks/invariants';
import { itineraryClaim } from '@/server/checks/itinerary';
import { alreadyKnown, matchOrbits, type CatalogueOrbit } from '@/server/checks/match-orbits';
import { noReturn } from '@/server/checks/no-return';
import { primePeriod, primeReturns } from '@/server/checks/prime';
import { rawRun, returnsToSection, type RunControl } from '@/server/checks/raw-run';
import { repeatSurvey } from '@/server/checks/repeat-survey';
import { repeatedOrbit, type RepeatedOrbit } from '@/server/checks/repeated-orbit';
import { checkedOrbit, closureOf, correctionOf, emptyReport } from '@/server/checks/report';
import { runFailure } from '@/server/checks/run-failure';
import { runOfPoints } from '@/server/checks/run-of-points';
import { selfCheck } from '@/server/checks/self-check';
import { crossingDirection, offSection, startPoint } from '@/server/checks/start-point';
import { stiffness } from '@/server/checks/stiffness';
import { type RawRun, type Study, type Survey } from '@/server/checks/study';
import { SuggestionFinder } from '@/server/checks/suggestion';
import { surveyOrbit } from '@/server/checks/survey-orbit';
import { isTangent, transversalityFindings } from '@/server/checks/transversality';
import { shiftsOf, verdictOf } from '@/server/checks/verdict';
import { type FlowFailure } from '@/server/numerics/periodic/shoot';
import { smallestTransversality } from '@/server/numerics/periodic/smallest-transversality';

type Answer = Omit<CheckReport, 'engine'>;

/** How a claim is to be checked. */
export interface CheckControl {
  maxSteps: number;
  catalogue: readonly CatalogueOrbit[];
  /** In a submission an orbit that is known already is a blocker, in a trial a note. */
  isSubmission: boolean;
  shouldStop?: (() => boolean) | undefined;
  onProgress?: ((progress: CheckProgress) => void) | undefined;
}

/** Steps between two reports of progress. */
const STEPS_PER_REPORT = 256;

/** Checks one claim, station by station; each station ends the check or hands over to the next. */
export class ClaimCheck {
  steps = 0;

  constructor(
    private readonly claim: Claim,
    private readonly control: CheckControl,
  ) {}

  /** The point itself: can the field be evaluated, does it stand still, does it lie on the section? */
  run(): Answer {
    const { claim } = this;
    const point = startPoint(claim);
    const field = claim.flow.field(point.start);
    if (!field.every(Number.isFinite)) {
      const failure = { ok: false, reason: 'singularity', t: 0, state: point.start, steps: 0, node: null } as const;
      return this.answer({ findings: [runFailure(failure, claim.variables, this.control.maxSteps)] });
    }
    const atRest = equilibrium(claim, point.start);
    if (atRest.length > 0) return this.answer({ findings: atRest });
    const onSection = point.beyond === 0;
    const raw = rawRun(claim, { start: point.start, onSection, period: claim.period.value }, this.runControl());
    if (!raw.ok) return this.alongPoints(point.start) ?? this.ended(raw);
    this.steps += raw.stepEnds.length;
    const off = offSection(claim, point, raw.sizes);
    if (off.length > 0) return this.answer(this.ofRaw(raw, off));
    return this.direction(raw);
  }

  /** A run that ended early. */
  private ended(failure: FlowFailure): Answer {
    const isLimit = failure.reason === 'stopped' || failure.reason === 'too-many-steps';
    const findings = [runFailure(failure, this.claim.variables, this.control.maxSteps)];
    return this.answer({ verdict: isLimit ? 'inconclusive' : 'does-not-close', findings });
  }

  /** An orbit whose run departs from it and ends early, if its section points lead to it all the same. */
  private alongPoints(start: Float64Array): Answer | null {
    const { claim } = this;
    const run = runOfPoints(claim, start, this.runControl());
    if (run === null || crossingDirection(claim, start, run.sizes).length > 0) return null;
    const corrected = correctClaim(claim, run, this.runControl());
    return corrected.correction.converged ? this.judged(corrected) : null;
  }

  /** The section: is it crossed the counted way, and does the flow come back to it? */
  private direction(raw: RawRun): Answer {
    const { claim } = this;
    const wrong = crossingDirection(claim, raw.start, raw.sizes);
    if (wrong.length > 0) {
      return this.answer({ ...this.ofRaw(raw, wrong), suggestion: this.suggestions().negatedSection(raw) });
    }
    if (!returnsToSection(claim, raw, claim.period.value, this.runControl())) {
      return this.answer(this.ofRaw(raw, [...noReturn(raw, claim.period.value), ...this.tangency(raw)]));
    }
    return this.correction(raw);
  }

  /** Newton, and the verdict. */
  private correction(typed: RawRun): Answer {
    const { claim, control } = this;
    const repeated = typed.relative <= claim.tolerance ? null : repeatedOrbit(claim, typed, this.runControl());
    if (repeated !== null) return this.repetition(typed, repeated);
    const corrected = correctClaim(claim, typed, {
      ...this.runControl(),
      onIteration: (iteration) => this.report({ phase: 'correcting', iteration }, typed),
    });
    const { converged } = corrected.correction;
    const failure = converged ? null : corrected.correction.failure;
    if (failure !== null && (failure.reason === 'stopped' || failure.reason === 'too-many-steps')) {
      const findings = [runFailure(failure, claim.variables, control.maxSteps)];
      return this.answer({ ...this.ofRaw(typed, findings), verdict: 'inconclusive' });
    }
    return this.judged(corrected);
  }

  /** The verdict, and what is measured on the orbit that was found. */
  private judged({ raw, correction }: ClaimCorrection): Answer {
    const { claim } = this;
    this.steps += correction.steps;
    const shifts = shiftsOf(claim, raw, correction);
    const verdict = verdictOf(claim.tolerance, raw, shifts);
    const closed = correction.converged
      ? correctedAsClosed(claim, raw, correction)
      : verdict === 'closes'
        ? typedAsClosed(claim, raw, this.runControl())
        : null;
    const survey = closed === null ? null : surveyOrbit(claim, closed);
    if (survey !== null && (verdict === 'does-not-close' || isTangent(survey))) {
      survey.primeReturns = survey.crossings.length;
    } else if (survey !== null) survey.primeReturns = primeReturns(claim, raw, survey, this.runControl());
    const expected = expectedClosure(claim, raw, correction.typed);
    return this.findings({ claim, raw, correction, shifts, verdict, survey, expectedClosure: expected });
  }

  /** An orbit that is run through several times and so unstable that only the first turns show it. */
  private repetition(typed: RawRun, { turns, raw: turn, orbit }: RepeatedOrbit): Answer {
    const { claim } = this;
    this.steps += turn.stepEnds.length + orbit.steps;
    const raw = { ...typed, sizes: turn.sizes };
    const rounds = Array.from({ length: turns }, () => orbit.typed);
    const correction = { ...orbit, period: turns * orbit.period, typed: rounds.flat() };
    const shifts = shiftsOf(claim, raw, correction);
    const verdict = verdictOf(claim.tolerance, raw, shifts);
    const measured = surveyOrbit(claim, correctedAsClosed(claim, turn, orbit));
    if (measured !== null) measured.primeReturns = primeReturns(claim, turn, measured, this.runControl());
    const survey = measured === null ? null : repeatSurvey(measured, turns);
    const expected = expectedClosure(claim, raw, correction.typed);
    return this.findings({ claim, raw, correction, shifts, verdict, survey, expectedClosure: expected });
  }

  /** Everything that is said about a closed or nearly closed orbit. */
  private findings(study: Study): Answer {
    const { claim, raw, correction, shifts, verdict, survey } = study;
    const returns = survey?.crossings.length ?? raw.returnsInside;
    this.report({ phase: 'measuring', iteration: correction.iterations, returns }, raw);
    const isOpen = verdict === 'does-not-close';
    const few = tooFewDigits(study);
    const hasEnd = Number.isFinite(raw.relative);
    const turns = isOpen && hasEnd && few.length === 0 ? closesLater(claim, raw, this.runControl()) : null;
    const findings = [...few, ...(few.length > 0 ? [] : turns === null ? convergence(study) : partOfPeriod(turns))];
    if (survey === null) findings.push(...this.tangency(raw));
    else {
      findings.push(...(isOpen ? primePeriod(survey) : this.ofClosed(survey)), ...selfCheck(survey));
      findings.push(...stiffness(raw.stepEnds.length, survey.crossings.length));
    }
    const matches = this.matches(study);
    if (!isOpen) findings.push(...alreadyKnown(matches, this.control.isSubmission));
    return this.answer({
      ...this.ofRaw(raw, findings),
      verdict,
      correction: correction.converged && shifts !== null ? correctionOf(correction, shifts, claim.hold) : null,
      orbit: survey === null ? null : checkedOrbit(survey),
      matches,
      digits: digitsOf(study),
      expectedClosure: study.expectedClosure,
      suggestion: this.suggestionFor(study, turns),
    });
  }

  /** Claims about returns are not judged where a tangency leaves their number undefined. */
  private ofClosed(survey: Survey): Finding[] {
    const { claim } = this;
    const counted = isTangent(survey)
      ? []
      : [...primePeriod(survey), ...returnClaims(claim, survey), ...itineraryClaim(claim.itinerary, survey.itinerary)];
    return [
      ...transversalityFindings(survey),
      ...counted,
      ...multiplierClaims(claim, survey),
      ...invariantDrift(survey),
    ];
  }

  private matches({ raw, survey }: Study): CheckReport['matches'] {
    if (survey === null || this.control.catalogue.length === 0) return [];
    this.report({ phase: 'comparing' }, raw);
    return matchOrbits(this.claim, survey, this.control.catalogue);
  }

  private suggestionFor(study: Study, turns: number | null): CheckReport['suggestion'] {
    const { survey, verdict, raw } = study;
    if (turns !== null) return this.suggestions().wholePeriod(turns);
    if (verdict === 'does-not-close') return this.suggestions().forOpenOrbit(study);
    if (survey === null || survey.primeReturns === survey.crossings.length) return null;
    return this.suggestions().primePeriod(raw.start, survey.crossings[survey.primeReturns - 1]!.time);
  }

  private suggestions(): SuggestionFinder {
    const { maxSteps, shouldStop } = this.control;
    return new SuggestionFinder(this.claim, { maxSteps, shouldStop });
  }

  private tangency(raw: RawRun): Finding[] {
    const { zeros, nearMisses } = raw.watch;
    const start = { time: 0, timeLow: 0, state: raw.start, direction: 1 as const };
    const smallest = smallestTransversality(this.claim.flow, { zeros: [start, ...zeros], nearMisses }, raw.sizes);
    return transversalityFindings({ smallest });
  }

  private ofRaw(raw: RawRun, findings: Finding[]): Partial<Answer> {
    const { tolerance } = this.claim;
    return {
      verdict: verdictOf(tolerance, raw, null),
      closure: closureOf(raw, tolerance),
      endPoint: Number.isFinite(raw.relative) ? Array.from(raw.end, decimalOf) : null,
      findings,
    };
  }

  private answer(known: Partial<Answer>): Answer {
    return { ...emptyReport, findings: [], matches: [], ...known };
  }

  private runControl(): RunControl {
    const { maxSteps, shouldStop } = this.control;
    let steps = 0;
    return {
      maxSteps,
      shouldStop,
      onStep: (time, watch) => {
        steps += 1;
        if (steps % STEPS_PER_REPORT === 1) this.report({ phase: 'integrating', time }, { watch });
      },
    };
  }

  private report(known: Pick<CheckProgress, 'phase'> & Partial<CheckProgress>, { watch }: Pick<RawRun, 'watch'>): void {
    const period = this.claim.period.value;
    this.control.onProgress?.({
      time: period,
      iteration: 0,
      returns: watch.counted(),
      crossings: watch.zeros.length,
      ...known,
      period,
    });
  }
}
