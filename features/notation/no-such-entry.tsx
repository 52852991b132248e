import { Fragment } from 'react';
import { entryHref } from '@/features/api/page-addresses';
import { Button, Empty, LinkText, Text } from '@/features/ui';

interface NoSuchEntryProps {
  accession: string;
  /** What the server says; accessions in it become links. */
  error: Error;
  onSearch?: () => void;
}

const ACCESSION = /(RTN-\d{7}[\dX])/;

/** There is no such entry: what may be wrong with the accession, and the one it may stand for. */
export function NoSuchEntry({ accession, error, onSearch }: NoSuchEntryProps) {
  return (
    <Empty
      actions={
        onSearch ? (
          <Button onPress={onSearch}>Search the catalogue</Button>
        ) : (
          <Button href="/">Search the catalogue</Button>
        )
      }
    >
      {error.message.split(ACCESSION).map((part, index) => (
        <Fragment key={index}>
          {ACCESSION.test(part) && part !== accession ? (
            <LinkText href={entryHref(part)}>{part}</LinkText>
          ) : ACCESSION.test(part) ? (
            <Text mono>{part}</Text>
          ) : (
            part
          )}
        </Fragment>
      ))}
    </Empty>
  );
}
