import { type ReactNode, Suspense, useId, useRef, useState } from 'react';
import { View } from 'react-native';
import {
  CopyButton,
  type DataColumn,
  type DataRow,
  DataTable,
  Heading,
  space,
  StaffLines,
  Text,
  TextButton,
  useAnnounce,
} from '@/features/ui';
import { saveSvg } from './save-svg';

/** The numbers of a picture, for those who do not see it. */
export interface FigureTable {
  columns: readonly DataColumn[];
  rows: readonly DataRow[];
}

export interface FigureProps {
  title: ReactNode;
  /** The title in plain words. */
  name: string;
  /** One sentence that states what is seen. */
  caption: ReactNode;
  table: FigureTable;
  /** What *Copy data* copies, as JSON. */
  data: unknown;
  /** Without its ending. */
  fileName: string;
  /** Height of the picture in its width; 1 unless given. */
  aspect?: number;
  /** At the right of the title: selects of coordinates. */
  controls?: ReactNode;
  /** After the links. */
  after?: ReactNode;
  /** Row and crossing selected together: the key of a row is the crossing's index. */
  selected?: number | null;
  onSelect?: (crossing: number) => void;
  level?: 2 | 3;
  children: (size: { width: number; height: number }) => ReactNode;
}

/** So that pictures side by side begin at the same height. */
const TITLE_ROW = 44;

type Shown = Pick<FigureProps, 'name' | 'table' | 'selected' | 'onSelect'> & { height: number };

function TableShown({ name, table, selected, onSelect, height }: Shown) {
  return (
    <div
      style={{ height, overflowY: 'auto' }}
      // The table scrolls at the picture's height, so the keyboard must reach it.
      // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- a scrolling region has to take focus
      tabIndex={0}
      role="region"
      aria-label={`${name}, table`}
    >
      <DataTable
        caption={name}
        hideCaption
        narrow
        columns={table.columns}
        rows={table.rows}
        selected={selected === null || selected === undefined ? null : String(selected)}
        {...(onSelect && { onSelect: (key: string) => onSelect(parseInt(key, 10)) })}
      />
    </div>
  );
}

interface LinksProps extends Pick<FigureProps, 'name' | 'data' | 'after'> {
  asTable: boolean;
  onTable: () => void;
  onSave: () => void;
}

function Links({ name, data, after, asTable, onTable, onSave }: LinksProps) {
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.two }} role="group" aria-label={name}>
      <TextButton size={14} onPress={onTable}>
        {asTable ? 'Picture' : 'Table'}
      </TextButton>
      <TextButton size={14} onPress={onSave} disabled={asTable}>
        Save SVG
      </TextButton>
      <CopyButton size={14} text={() => JSON.stringify(data)} what={name} said="Copied, as JSON">
        Copy data
      </CopyButton>
      {after}
    </View>
  );
}

function TitleRow({
  title,
  id,
  level = 3,
  controls,
}: Pick<FigureProps, 'title' | 'level' | 'controls'> & { id: string }) {
  return (
    <View
      style={{
        minHeight: TITLE_ROW,
        flexDirection: 'row',
        flexWrap: 'wrap',
        alignItems: 'center',
        alignContent: 'center',
        justifyContent: 'space-between',
        gap: space.one,
      }}
    >
      <Heading level={level} size={16} id={id}>
        {title}
      </Heading>
      {controls}
    </View>
  );
}

/** A picture with its title, caption, table, and ways to take it away. */
export function Figure(props: FigureProps) {
  const { name, caption, table, fileName, aspect = 1, selected = null, onSelect, children } = props;
  const [width, setWidth] = useState<number | null>(null);
  const [asTable, setAsTable] = useState(false);
  const box = useRef<HTMLDivElement>(null);
  const announce = useAnnounce();
  const titleId = useId();
  const height = Math.round((width ?? 0) * aspect);
  const save = () => {
    const picture = box.current?.querySelector('svg');
    if (!picture) return;
    saveSvg(picture, `${fileName}.svg`);
    announce('Saved as SVG');
  };
  return (
    <figure aria-labelledby={titleId} style={{ margin: 0, minWidth: 0 }}>
      <View style={{ gap: space.one }}>
        <TitleRow {...props} id={titleId} />
        <View style={{ minHeight: height }} onLayout={(event) => setWidth(event.nativeEvent.layout.width)}>
          {width && asTable ? (
            <TableShown {...{ name, table, height, selected }} {...(onSelect && { onSelect })} />
          ) : null}
          {width && !asTable ? (
            <div ref={box}>
              <Suspense fallback={<StaffLines kind="loading" />}>{children({ width, height })}</Suspense>
            </div>
          ) : null}
        </View>
        <figcaption>
          <Text size={14} tone="muted">
            {caption}
          </Text>
        </figcaption>
        <Links {...props} asTable={asTable} onTable={() => setAsTable(!asTable)} onSave={save} />
      </View>
    </figure>
  );
}
