import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { useSafeAreaInsets } from 'react-native-safe-area-context';
import { DocumentTitle } from './DocumentTitle';
import { Mark } from './Mark';
import { PatternPicture } from './PatternPicture';
import { Text } from './Text';
import { fontFamily, space } from './tokens';
import { Touch } from './Touch';
import { useLook } from './useLook';

export interface PublicPageProps {
  title: string;
  /** Under the wordmark, where the page is not the sign-in itself. */
  heading?: string;
  children: ReactNode;
  /** Two quiet ways on, at the foot. */
  foot?: ReactNode;
  /** Less of the pattern on a phone, where the page has much to fill in. */
  low?: boolean;
}

/** Pages before the sign-in: the pattern, the name, and what is to be done. There is no hue here: no bench is chosen. */
export function PublicPage({ title, heading, children, foot, low }: PublicPageProps) {
  const { colours, layout, widthPx, heightPx } = useLook();
  const insets = useSafeAreaInsets();
  const side = widthPx >= 900;
  const wordmark = (
    <Touch
      href="/sign-in"
      label="Ringwright"
      style={{ flexDirection: 'row', alignItems: 'center', gap: side ? 18 : 13, alignSelf: 'flex-start' }}
    >
      <Mark size={side ? 54 : 38} />
      <Text
        tone="ink0"
        level={heading ? undefined : 1}
        style={{
          fontFamily: fontFamily.figureMedium,
          fontSize: side ? 44 : Math.min(40, widthPx / 9.6),
          lineHeight: side ? 48 : 44,
          letterSpacing: -1,
        }}
      >
        Ringwright
      </Text>
    </Touch>
  );
  const content = (
    <View style={{ gap: space.hair }}>
      {heading ? (
        <Text variant="title" level={1} style={{ marginBottom: space.m }}>
          {heading}
        </Text>
      ) : null}
      {children}
    </View>
  );

  if (side) {
    const frameHeight = Math.round(heightPx * 0.71);
    return (
      <View style={{ flex: 1, flexDirection: 'row', gap: space.hair, backgroundColor: colours.gap }}>
        <DocumentTitle title={title} />
        <View
          role="complementary"
          aria-label="What Ringwright does"
          style={{ flex: 1, minWidth: 0, overflow: 'hidden' }}
        >
          <PatternPicture frameHeight={frameHeight} footHeight={Math.min(150, heightPx - frameHeight - 90)} rings={7} />
          <Text tone="ink2" style={{ position: 'absolute', left: 48, bottom: 40, fontSize: 16, lineHeight: 23 }}>
            The size of a small hole, from the rings it throws.
          </Text>
        </View>
        <View role="main" style={{ width: 456, backgroundColor: colours.plate }}>
          <ScrollView
            style={{ flex: 1 }}
            contentContainerStyle={{ paddingHorizontal: 48, paddingVertical: 48, flexGrow: 1 }}
            keyboardShouldPersistTaps="handled"
          >
            <View
              style={{
                marginTop: Math.max(0, Math.min(102, (heightPx - 800) * 1.02)),
                marginBottom: heading ? 48 : Math.max(40, Math.min(96, heightPx * 0.09)),
              }}
            >
              {wordmark}
            </View>
            {content}
          </ScrollView>
          {foot ? <View style={{ backgroundColor: colours.gap, paddingTop: space.hair }}>{foot}</View> : null}
        </View>
      </View>
    );
  }

  const narrow = layout === 'phone';
  const frameHeight = low ? 120 : narrow ? Math.round(Math.min(300, heightPx * 0.34)) : 320;
  return (
    <View style={{ flex: 1, backgroundColor: colours.gap, paddingTop: insets.top, paddingBottom: insets.bottom }}>
      <DocumentTitle title={title} />
      <ScrollView
        role="main"
        style={{ flex: 1 }}
        contentContainerStyle={{ flexGrow: 1 }}
        keyboardShouldPersistTaps="handled"
      >
        <PatternPicture frameHeight={frameHeight} footHeight={low ? 74 : 92} rings={narrow ? 5 : 7} />
        <View
          style={{
            width: '100%',
            maxWidth: narrow ? undefined : 560,
            paddingHorizontal: narrow ? space.l : 48,
            paddingBottom: space.xl,
          }}
        >
          {wordmark}
          {heading ? (
            <View style={{ height: space.l }} />
          ) : (
            <Text style={{ paddingTop: 4, paddingBottom: 18 }}>
              {'The size of a small hole,\nfrom the rings it throws.'}
            </Text>
          )}
          {content}
        </View>
        {foot ? <View style={{ marginTop: 'auto' }}>{foot}</View> : null}
      </ScrollView>
    </View>
  );
}
