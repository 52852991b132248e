import { type Finding } from '@/schemas/generated/contract';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { type FlowFailure } from '@/server/numerics/periodic/shoot';

/** Say why a run ended before its time. */
export function runFailure(failure: FlowFailure, variables: readonly string[], maxSteps: number): Finding {
  const where = variables.map((name, i) => `${name} = ${figure(failure.state[i]!)}`).join(', ');
  const time = figure(failure.t);
  switch (failure.reason) {
    case 'singularity': {
      const node = failure.node === null ? '' : ` (${failure.node})`;
      const message = `The solution leaves the field's domain near t = ${time}${node}, at ${where}.`;
      return finding('singularity', { message, value: failure.t });
    }
    case 'escape':
      return finding('escapes', {
        message: `The solution runs away: at t = ${time} it is at ${where}.`,
        value: failure.t,
      });
    case 'too-many-steps':
      return finding('too-long', {
        message: `The integration used its ${maxSteps} steps and had come to t = ${time}.`,
        value: failure.steps,
        limit: maxSteps,
      });
    case 'stopped':
      return finding('too-long', {
        message: `The time allowed for this check ran out; the integration had come to t = ${time}.`,
        value: failure.t,
      });
  }
}
