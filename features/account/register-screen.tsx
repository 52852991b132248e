import { useState } from 'react';
import { View } from 'react-native';
import { ApiError } from '@/features/api/api-error';
import { useRegister } from '@/features/api/session';
import { Button, Field, Form, LinkText, space, Text } from '@/features/ui';
import { AccountPage } from './account-page';
import { FormFailure } from './form-failure';
import { PasswordField } from './password-field';

function MailSent({ message }: { message: string }) {
  return (
    <AccountPage title="Register">
      <Text role="status">{message}</Text>
      <LinkText href="/sign-in" target>
        Sign in
      </LinkText>
    </AccountPage>
  );
}

const nothing = { name: '', email: '', password: '', orcid: '' };

/** Open an account; a mail with a link confirms the address. */
export function RegisterScreen() {
  const register = useRegister();
  const [typed, setTyped] = useState(nothing);
  const set = (member: keyof typeof nothing) => (text: string) => setTyped((now) => ({ ...now, [member]: text }));
  const messageAt = (pointer: string) =>
    register.error instanceof ApiError ? register.error.messageAt(pointer) : null;
  if (register.isSuccess) return <MailSent message={register.data.message} />;
  const { orcid, ...required } = typed;
  const isPlaced = ['/name', '/email', '/password', '/orcid'].some((pointer) => messageAt(pointer) !== null);
  return (
    <AccountPage title="Register">
      <Text>A confirmed account sends orbits to the catalogue. Your name stands beside what you contribute.</Text>
      <Form name="Register" onSubmit={() => register.mutate({ ...required, ...(orcid && { orcid }) })}>
        <View style={{ gap: space.two }}>
          <Field
            label="Name"
            name="name"
            autoComplete="name"
            value={typed.name}
            onChangeText={set('name')}
            required
            error={messageAt('/name')}
          />
          <Field
            label="E-mail"
            name="email"
            type="email"
            autoComplete="username"
            value={typed.email}
            onChangeText={set('email')}
            required
            error={messageAt('/email')}
          />
          <PasswordField isNew value={typed.password} onChangeText={set('password')} error={messageAt('/password')} />
          <Field
            label="ORCID"
            optional
            mono
            value={orcid}
            onChangeText={set('orcid')}
            placeholder="0000-0000-0000-0000"
            error={messageAt('/orcid')}
          />
          <FormFailure error={isPlaced ? null : register.error} what="Registering" />
          <Button filled submit disabledBecause={register.isPending ? 'Registering…' : null}>
            Register
          </Button>
        </View>
      </Form>
    </AccountPage>
  );
}
