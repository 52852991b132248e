import { useState } from 'react';
import { draftOfBody, type OrbitDraft } from '@/features/checking/orbit-draft';
import { readPasted } from '@/features/checking/read-pasted';
import { Button, Sheet, Text, TextArea } from '@/features/ui';

interface Props {
  open: boolean;
  onClose: () => void;
  onPaste: (draft: OrbitDraft) => void;
}

/** Takes a submission's body, a line of an export, or a row of a table with its header. */
export function PastePanel({ open, onClose, onPaste }: Props) {
  const [text, setText] = useState('');
  const pasted = text.trim() === '' ? null : readPasted(text);
  const isUnread = text.trim() !== '' && pasted === null;
  const onFill = () => {
    if (!pasted) return;
    onPaste(draftOfBody(pasted.body));
    setText('');
    onClose();
  };
  return (
    <Sheet
      open={open}
      onClose={onClose}
      title="Paste JSON or a row"
      footer={
        <>
          <Button filled onPress={onFill} disabledBecause={pasted ? null : 'Nothing that fits is pasted yet.'}>
            Fill the form
          </Button>
          <Button onPress={onClose}>Cancel</Button>
        </>
      }
    >
      <TextArea
        label="A body as JSON, an entry, or two lines of CSV: names, then values"
        mono
        rows={8}
        value={text}
        onChangeText={setText}
        error={isUnread ? 'Neither JSON nor a row with its header. Your text is kept here.' : null}
      />
      {pasted && pasted.leftOut.length > 0 ? (
        <Text tone="ochre">Not taken, since an orbit has no such members: {pasted.leftOut.join(', ')}.</Text>
      ) : null}
    </Sheet>
  );
}
