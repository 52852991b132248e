import { type ReactNode, useEffect } from 'react';
import { View } from 'react-native';
import { DoubleRule } from './double-rule';
import { Heading } from './heading';
import { useLayout } from './layout';
import { LinkText } from './link-text';
import { font, space, touchTarget } from './tokens';

export interface PageProps {
  /** Plain words: the document's title. */
  title: string;
  /** The heading as drawn, when it is more than the title. */
  heading?: ReactNode;
  /** The heading is the name of a system. */
  italic?: boolean;
  /** 34 px on a wide screen: an entry. */
  large?: boolean;
  /** After the heading: the state word. */
  state?: ReactNode;
  /** Under the heading. */
  subtitle?: ReactNode;
  /** Where one came from: "12 orbits". */
  back?: { href: string; label: ReactNode; onPress?: () => void };
  /** At the right of the back link: previous, next. */
  aside?: ReactNode;
  /** At the right of the heading; on a phone they stand in a `Strip` instead. */
  actions?: ReactNode;
  /** The page has no heading that one sees: the catalogue begins with its search line. */
  hideHeading?: boolean;
  children: ReactNode;
}

/** On a phone the back link stands in for the masthead, px. */
const BACK_ROW = 56;
/** With less than this left for the heading its actions stand on a line of their own, px. */
const HEADING_WIDTH = 180;

function Head(props: PageProps) {
  const { title, heading, italic, large, state, subtitle, actions } = props;
  const phone = useLayout() === 'phone';
  return (
    <View style={{ gap: space.one, marginBottom: space.three }}>
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          alignItems: 'flex-end',
          gap: space.two,
          paddingBottom: space.half,
        }}
      >
        <View
          style={{ flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: actions ? HEADING_WIDTH : 0, gap: space.half }}
        >
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'baseline', columnGap: space.oneHalf }}>
            <Heading level={1} {...(italic && { italic })} {...(large && !phone && { size: 34 })}>
              {heading ?? title}
            </Heading>
            {state}
          </View>
          {subtitle}
        </View>
        {actions ? (
          <View role="group" style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.oneHalf }}>
            {actions}
          </View>
        ) : null}
      </View>
      <DoubleRule />
    </View>
  );
}

/** A page: back link, title on the double rule with its actions, content. */
export function Page(props: PageProps) {
  const { title, back, aside, hideHeading, children } = props;
  const phone = useLayout() === 'phone';
  useEffect(() => {
    document.title = `${title} · Ritornel`;
  }, [title]);
  return (
    <View style={{ flexGrow: 1 }}>
      {back || aside ? (
        <View
          style={{
            minHeight: phone ? BACK_ROW : touchTarget,
            flexDirection: 'row',
            alignItems: 'center',
            justifyContent: 'space-between',
            gap: space.two,
          }}
        >
          {back ? (
            <LinkText href={back.href} size={16} target plain {...(back.onPress && { onPress: back.onPress })}>
              <span style={{ fontFamily: font.number }}>←</span> {back.label}
            </LinkText>
          ) : (
            <View />
          )}
          {aside}
        </View>
      ) : null}
      {hideHeading ? (
        <div className="r-hidden">
          <Heading level={1}>{title}</Heading>
        </div>
      ) : (
        <Head {...props} />
      )}
      {children}
    </View>
  );
}
