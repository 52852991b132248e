import { View } from 'react-native';
import { useConfirm } from '@/features/api/session';
import { Button, LinkText, space, Text } from '@/features/ui';
import { AccountPage } from './account-page';
import { FormFailure } from './form-failure';

/** Where the link of the mail leads: the address is confirmed by a press, so that a program that only reads links does nothing. */
export function ConfirmScreen({ token }: { token: string }) {
  const confirm = useConfirm();
  if (confirm.isSuccess) {
    return (
      <AccountPage title="Address confirmed">
        <Text role="status">Your address is confirmed. You can sign in now and send orbits.</Text>
        <LinkText href="/sign-in" target>
          Sign in
        </LinkText>
      </AccountPage>
    );
  }
  return (
    <AccountPage title="Confirm your address">
      <Text>One press, and the account is yours.</Text>
      <FormFailure error={confirm.error} what="Confirming" />
      <View style={{ flexDirection: 'row', gap: space.two }}>
        <Button
          filled
          onPress={() => confirm.mutate({ token })}
          disabledBecause={confirm.isPending ? 'Confirming…' : token ? null : 'The link of the mail is not complete.'}
        >
          Confirm my address
        </Button>
      </View>
      <LinkText href="/register" target>
        Ask for a new link
      </LinkText>
    </AccountPage>
  );
}
