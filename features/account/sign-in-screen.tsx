import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { isRefusal } from '@/features/api/api-error';
import { useSignIn } from '@/features/api/session';
import { Button, Field, Form, LinkText, space } from '@/features/ui';
import { AccountPage } from './account-page';
import { FormFailure } from './form-failure';
import { localAddress } from './local-address';
import { PasswordField } from './password-field';

/** Sign in; afterwards one is where one wanted to go. */
export function SignInScreen({ next }: { next: string }) {
  const router = useRouter();
  const signIn = useSignIn();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const onSubmit = () => {
    signIn.mutate({ email, password }, { onSuccess: () => router.replace(localAddress(next)) });
  };
  const mismatch = isRefusal(signIn.error, 'wrong-credentials', 'invalid-body');
  return (
    <AccountPage title="Sign in">
      <Form name="Sign in" onSubmit={onSubmit}>
        <View style={{ gap: space.two }}>
          <Field
            label="E-mail"
            name="email"
            type="email"
            autoComplete="username"
            value={email}
            onChangeText={setEmail}
            required
          />
          <PasswordField value={password} onChangeText={setPassword} />
          <FormFailure
            error={signIn.error}
            what="Signing in"
            sentence={mismatch ? 'E-mail and password do not match.' : null}
          />
          <Button filled submit disabledBecause={signIn.isPending ? 'Signing in…' : null}>
            Sign in
          </Button>
        </View>
      </Form>
      <View style={{ flexDirection: 'row', gap: space.three, flexWrap: 'wrap' }}>
        <LinkText href="/forgot" target>
          Forgot password
        </LinkText>
        <LinkText href="/register" target>
          Register
        </LinkText>
      </View>
    </AccountPage>
  );
}
