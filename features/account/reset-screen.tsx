import { useState } from 'react';
import { View } from 'react-native';
import { useResetPassword } from '@/features/api/session';
import { Button, Form, LinkText, space, Text } from '@/features/ui';
import { AccountPage } from './account-page';
import { FormFailure } from './form-failure';
import { PasswordField } from './password-field';

/** Where the link of the mail leads: set a new password. */
export function ResetScreen({ token }: { token: string }) {
  const reset = useResetPassword();
  const [password, setPassword] = useState('');
  if (reset.isSuccess) {
    return (
      <AccountPage title="Password set">
        <Text role="status">The new password holds. Everywhere you were signed in, you are now signed out.</Text>
        <LinkText href="/sign-in" target>
          Sign in
        </LinkText>
      </AccountPage>
    );
  }
  return (
    <AccountPage title="Set a new password">
      <Form name="Set a new password" onSubmit={() => reset.mutate({ token, password })}>
        <View style={{ gap: space.two }}>
          <PasswordField isNew value={password} onChangeText={setPassword} />
          <FormFailure error={reset.error} what="Setting the password" />
          <Button
            filled
            submit
            disabledBecause={reset.isPending ? 'Setting…' : token ? null : 'The link of the mail is not complete.'}
          >
            Set the password
          </Button>
        </View>
      </Form>
    </AccountPage>
  );
}
