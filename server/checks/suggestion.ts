import { type CheckReport } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { decimalOf } from '@/server/checks/decimal-of';
import { rawRun, type RunControl } from '@/server/checks/raw-run';
import { type RawRun, type Study, type Verdict } from '@/server/checks/study';
import { verdictOf } from '@/server/checks/verdict';

type Suggestion = NonNullable<CheckReport['suggestion']>;

/** A period with two digits exchanged is looked for within these factors of the stated one. */
const SMALLEST_PERIOD_FACTOR = 0.1;
const LARGEST_PERIOD_FACTOR = 3;

/** An exchanged period is integrated only where an orbit of about that period is known, or there are few. */
const MOST_SWAPS_TRIED = 24;

/** Steps of the integrator that all tries together may take: an offer is worth no more than the check itself. */
const MOST_STEPS = 20_000;

/** Tries changes to one field of a claim by integrating them. */
export class SuggestionFinder {
  /** Steps that are left for trying. */
  private left = MOST_STEPS;

  constructor(
    private readonly claim: Claim,
    private readonly control: RunControl,
  ) {}

  /** The section turned round, for a point where u falls. */
  negatedSection(raw: RawRun): Suggestion {
    const verdict = verdictOf(this.claim.tolerance, raw, null);
    return { field: 'section', value: this.claim.negatedSection, verdict };
  }

  /** The prime period, for an orbit that is run through more than once. */
  primePeriod(start: Float64Array, period: number): Suggestion | null {
    return this.tried({ field: 'period', value: decimalOf(period) }, { start, period });
  }

  /** The whole period, for an orbit that closes after some stated ones. */
  wholePeriod(turns: number): Suggestion {
    return { field: 'period', value: decimalOf(turns * this.claim.period.value), verdict: 'closes' };
  }

  /** For an orbit that does not close: two digits of the period exchanged, else the corrected period or point alone. */
  forOpenOrbit({ raw, correction }: Study): Suggestion | null {
    const swapped = this.swappedDigits(raw);
    if (swapped !== null || !correction.converged) return swapped;
    const corrected = correction.nodes[0]!;
    const period = decimalOf(correction.period);
    const point = Array.from(corrected, decimalOf);
    return (
      this.tried({ field: 'period', value: period }, { start: raw.start, period: correction.period }) ??
      this.tried({ field: 'point', value: point }, { start: corrected, period: this.claim.period.value })
    );
  }

  private swappedDigits(raw: RawRun): Suggestion | null {
    const { text, value } = this.claim.period;
    const swaps = exchangedDigits(text)
      .map((candidate) => ({ candidate, period: Number(candidate) }))
      .filter(({ period }) => period > SMALLEST_PERIOD_FACTOR * value && period < LARGEST_PERIOD_FACTOR * value)
      .slice(0, MOST_SWAPS_TRIED);
    for (const { candidate, period } of swaps) {
      const found = this.tried({ field: 'period', value: candidate }, { start: raw.start, period });
      if (found !== null) return found;
    }
    return null;
  }

  private tried(
    change: { field: string; value: string | string[] },
    orbit: { start: Float64Array; period: number },
  ): Suggestion | null {
    if (this.left <= 0) return null;
    const maxSteps = Math.min(this.control.maxSteps, this.left);
    const run = rawRun(this.claim, { ...orbit, onSection: true }, { ...this.control, maxSteps });
    this.left -= run.ok ? run.stepEnds.length : run.steps;
    if (!run.ok) return null;
    const verdict: Verdict = verdictOf(this.claim.tolerance, run, null);
    return verdict === 'closes' ? { ...change, verdict } : null;
  }
}

/** The number with each pair of neighbouring digits exchanged, where they differ; the decimal point stays. */
export function exchangedDigits(text: string): string[] {
  const places = Array.from(text).flatMap((character, i) => (/[0-9]/.test(character) ? [i] : []));
  const end = text.search(/[eE/]/);
  const digits = end === -1 ? places : places.filter((place) => place < end);
  return digits.slice(1).flatMap((place, k) => {
    const before = digits[k]!;
    if (text[before] === text[place]) return [];
    const characters = Array.from(text);
    [characters[before], characters[place]] = [characters[place]!, characters[before]!];
    return [characters.join('')];
  });
}
