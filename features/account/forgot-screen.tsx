import { useState } from 'react';
import { View } from 'react-native';
import { useForgotPassword } from '@/features/api/session';
import { Button, Field, Form, LinkText, space, Text } from '@/features/ui';
import { AccountPage } from './account-page';
import { FormFailure } from './form-failure';

/** Ask for a link to set a new password. */
export function ForgotScreen() {
  const forgot = useForgotPassword();
  const [email, setEmail] = useState('');
  if (forgot.isSuccess) {
    return (
      <AccountPage title="Forgot password">
        <Text role="status">{forgot.data.message}</Text>
        <LinkText href="/sign-in" target>
          Sign in
        </LinkText>
      </AccountPage>
    );
  }
  return (
    <AccountPage title="Forgot password">
      <Text>We send a link to set a new one, if the address has an account.</Text>
      <Form name="Forgot password" onSubmit={() => forgot.mutate({ email })}>
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
          <FormFailure error={forgot.error} what="Asking for a link" />
          <Button filled submit disabledBecause={forgot.isPending ? 'Sending…' : null}>
            Send the link
          </Button>
        </View>
      </Form>
    </AccountPage>
  );
}
