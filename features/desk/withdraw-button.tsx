import { useState } from 'react';
import { View } from 'react-native';
import { useWithdrawSubmission } from '@/features/api/submissions';
import { RefusedFields } from '@/features/checking/refused-fields';
import { Button, Sheet, Text, TextArea } from '@/features/ui';

/** Withdraw asks once: it cannot be undone. */
export function WithdrawButton({ id }: { id: string }) {
  const withdraw = useWithdrawSubmission();
  const [isAsking, setAsking] = useState(false);
  const [comment, setComment] = useState('');
  return (
    <View>
      <Button onPress={() => setAsking(true)}>Withdraw</Button>
      <Sheet
        open={isAsking}
        onClose={() => setAsking(false)}
        title="Withdraw this submission?"
        footer={
          <>
            <Button
              filled
              onPress={() => withdraw.mutate({ id, comment }, { onSuccess: () => setAsking(false) })}
              disabledBecause={withdraw.isPending ? 'Withdrawing…' : null}
            >
              Withdraw for good
            </Button>
            <Button onPress={() => setAsking(false)}>Keep it</Button>
          </>
        }
      >
        <Text>It stays readable with its history, and cannot be sent again.</Text>
        <TextArea label="Why" optional value={comment} onChangeText={setComment} />
        <RefusedFields error={withdraw.error} what="Withdrawing" />
      </Sheet>
    </View>
  );
}
