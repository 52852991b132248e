import { ForgotScreen } from '@/features/account/forgot-screen';

export default function ForgotRoute() {
  return <ForgotScreen />;
}
