import { useState } from 'react';
import { View } from 'react-native';
import { CheckPanel } from '@/features/bench/check-panel';
import { PastePanel } from '@/features/bench/paste-panel';
import { useBench } from '@/features/bench/use-bench';
import { EarlierChecks } from '@/features/bench/earlier-checks';
import type { OrbitDraft } from '@/features/checking/orbit-draft';
import { OrbitFields } from '@/features/checking/orbit-fields';
import { RefusedFields } from '@/features/checking/refused-fields';
import { Button, Form, Heading, space, Text, TextButton, useLayout } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

interface Props {
  systems: readonly System[];
  start: OrbitDraft;
}

/** Width of the form on a wide screen, px. */
const FORM_WIDTH = 304;

/** The form at the left, the report of this orbit beside it; on a phone the report takes the page. */
export function Bench({ systems, start }: Props) {
  const bench = useBench(systems, start);
  const [isPasting, setPasting] = useState(false);
  const layout = useLayout();
  const { draft, current } = bench;
  if (layout === 'phone' && current) {
    return (
      <View style={{ gap: space.two }}>
        <TextButton onPress={bench.edit}>← Edit the orbit</TextButton>
        <CheckPanel systems={systems} bench={bench} />
      </View>
    );
  }
  const form = (
    <View style={layout === 'phone' ? { gap: space.two } : { width: FORM_WIDTH, flexShrink: 0, gap: space.two }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
        <Heading level={2}>Orbit</Heading>
        <TextButton onPress={() => setPasting(true)}>Paste JSON or a row</TextButton>
      </View>
      <PastePanel open={isPasting} onClose={() => setPasting(false)} onPaste={bench.change} />
      <Form name="Orbit" onSubmit={bench.run}>
        <View
          style={{ gap: space.two }}
          {...{
            onKeyDown: (event: { key: string; ctrlKey: boolean; metaKey: boolean }) => {
              if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) bench.run();
            },
          }}
        >
          <OrbitFields systems={systems} draft={draft} onChange={bench.change} messageAt={bench.messageAt} />
          <RefusedFields error={bench.error} what="The check" />
          <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.one }}>
            <Button filled submit disabledBecause={bench.isChecking ? 'A check is under way.' : null}>
              {current ? 'Check again' : 'Check this orbit'}
            </Button>
            <Text size={13} tone="muted" mono>
              Ctrl ↵
            </Text>
          </View>
          {bench.undo ? <TextButton onPress={bench.undo}>Undo the change</TextButton> : null}
        </View>
      </Form>
    </View>
  );
  return (
    <View style={{ flexDirection: layout === 'phone' ? 'column' : 'row', gap: space.six, alignItems: 'stretch' }}>
      {form}
      {layout === 'phone' ? null : (
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0, gap: space.four }}>
          <CheckPanel systems={systems} bench={bench} />
          <EarlierChecks tried={bench.tried.slice(1)} onOpen={bench.change} />
        </View>
      )}
    </View>
  );
}
