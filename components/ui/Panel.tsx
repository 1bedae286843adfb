import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { IconButton } from './IconButton';
import { Text } from './Text';
import { radius, shell, space } from './tokens';
import { useLook } from './useLook';
import { webProps } from './webProps';

export interface PanelProps {
  title?: string;
  note?: string;
  back?: Href;
  action?: ReactNode;
  foot?: ReactNode;
  /** px; without it the panel takes what is left. */
  width?: number;
  level?: 1 | 2;
  scroll?: boolean;
  measure?: number;
  /** The panel that is the screen's subject. */
  main?: boolean;
  children: ReactNode;
}

/** A panel of the desk: head, content that scrolls by itself, foot. */
export function Panel({
  title,
  note,
  back,
  action,
  foot,
  width,
  level = 2,
  scroll = true,
  measure,
  main,
  children,
}: PanelProps) {
  const { colours } = useLook();
  const column = <View style={[{ gap: space.hair }, scroll ? null : { flex: 1, minHeight: 0 }]}>{children}</View>;
  const content = measure ? (
    <View style={{ flexDirection: 'row', gap: space.hair }}>
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: measure, maxWidth: measure }}>{column}</View>
      <View style={{ flexGrow: 1, backgroundColor: colours.plate, borderRadius: radius.plate }} />
    </View>
  ) : (
    column
  );
  return (
    <View
      role={main ? 'main' : 'complementary'}
      aria-label={main ? undefined : title}
      style={[{ gap: space.hair, minHeight: 0, minWidth: 0 }, width ? { width } : { flex: 1 }]}
    >
      {title ? (
        <View
          style={{
            height: shell.panelHead,
            backgroundColor: colours.plate,
            borderRadius: radius.plate,
            flexDirection: 'row',
            alignItems: 'center',
            gap: space.m,
            paddingLeft: back === undefined ? 20 : 4,
            paddingRight: action ? 10 : 20,
          }}
        >
          {back === undefined ? null : <IconButton icon="back" label="Back" href={back} />}
          <Text
            variant="title"
            level={level}
            lines={1}
            style={note ? { flexShrink: 0, maxWidth: '75%' } : { flexShrink: 1 }}
          >
            {title}
          </Text>
          {note ? (
            <Text
              tone="ink2"
              lines={1}
              style={{ flexShrink: 1, marginLeft: back === undefined && !action ? 'auto' : 0 }}
            >
              {note}
            </Text>
          ) : null}
          {action ? (
            <View style={{ marginLeft: 'auto', flexDirection: 'row', alignItems: 'center', gap: space.s }}>
              {action}
            </View>
          ) : null}
        </View>
      ) : null}
      {scroll ? (
        <ScrollView
          tabIndex={0}
          style={{ flex: 1, backgroundColor: colours.plate, borderRadius: radius.plate }}
          contentContainerStyle={{ flexGrow: 1, backgroundColor: colours.gap }}
          keyboardShouldPersistTaps="handled"
          {...webProps({ tabIndex: 0 })}
        >
          {content}
          <View
            style={{ flexGrow: 1, marginTop: space.hair, backgroundColor: colours.plate, borderRadius: radius.plate }}
          />
        </ScrollView>
      ) : (
        content
      )}
      {foot}
    </View>
  );
}
