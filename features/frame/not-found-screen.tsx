import { Button, Empty, Page, Text } from '@/features/ui';

/** An address that leads nowhere. */
export function NotFoundScreen({ path }: { path: string }) {
  return (
    <Page title="Nothing here">
      <Empty
        actions={
          <>
            <Button href="/">Search the catalogue</Button>
            <Button href="/systems">See the systems</Button>
          </>
        }
      >
        There is no page at <Text mono>{path}</Text>.
      </Empty>
    </Page>
  );
}
