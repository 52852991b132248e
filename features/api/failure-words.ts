import { ApiError } from '@/features/api/api-error';

export interface FailureWords {
  title: string;
  sentence: string;
  requestId: string | null;
}

/** A failed request in words: what happened and that nothing was lost. `what` names the thing, such as "The search". */
export function failureWords(error: unknown, what: string, kept: string): FailureWords {
  if (!(error instanceof ApiError)) {
    return { title: `${what} did not work`, sentence: `Something broke on this page. ${kept}`, requestId: null };
  }
  const { requestId } = error;
  switch (error.kind) {
    case 'offline':
      return { title: 'No connection', sentence: `The archive cannot be reached. ${kept}`, requestId };
    case 'timeout':
      return { title: `${what} did not answer`, sentence: `${error.message} ${kept}`, requestId };
    case 'server':
      return { title: `${what} did not answer`, sentence: `${error.message} ${kept}`, requestId };
    case 'refused':
      return { title: `${what} was refused`, sentence: refusalSentence(error), requestId };
  }
}

function refusalSentence(error: ApiError): string {
  const errors = error.problem?.errors ?? [];
  return errors.length === 1 ? (errors[0]?.message ?? error.message) : error.message;
}
