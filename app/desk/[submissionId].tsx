import { useLocalSearchParams } from 'expo-router';
import { SubmissionScreen } from '@/features/desk/lazy-desk';

export default function SubmissionRoute() {
  const { submissionId } = useLocalSearchParams<{ submissionId: string }>();
  return <SubmissionScreen submissionId={submissionId} />;
}
