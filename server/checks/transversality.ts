import { type Finding } from '@/schemas/generated/contract';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { NEAR_TANGENT, TANGENT } from '@/server/checks/limits';
import { type Survey } from '@/server/checks/study';

/** Whether the orbit touches the section, so that its returns have no number. */
export function isTangent({ smallest }: Pick<Survey, 'smallest'>): boolean {
  return smallest.cosine < TANGENT;
}

/** Check that the orbit meets the section transversally everywhere, so that its returns can be counted. */
export function transversalityFindings({ smallest }: Pick<Survey, 'smallest'>): Finding[] {
  const { cosine, time, missed } = smallest;
  if (cosine >= NEAR_TANGENT) return [];
  const touches = cosine < TANGENT;
  const how = missed ? 'comes near the section without meeting it' : 'meets the section';
  const consequence = touches
    ? 'The number of returns is not defined there.'
    : 'A small change of the orbit would add or remove returns.';
  return [
    finding(touches ? 'tangent-crossing' : 'near-tangent-crossing', {
      message: `At t = ${figure(time)} the orbit ${how} almost along it (|cosine| ${figure(cosine)}). ${consequence}`,
      value: cosine,
      limit: touches ? TANGENT : NEAR_TANGENT,
    }),
  ];
}
