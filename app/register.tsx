import { RegisterScreen } from '@/features/account/register-screen';

export default function RegisterRoute() {
  return <RegisterScreen />;
}
