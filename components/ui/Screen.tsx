import type { Href } from 'expo-router';
import type { ReactNode } from 'react';
import { ScrollView, View } from 'react-native';
import { useBenchLight } from '@/hooks/theme/ThemeProvider';
import { DocumentTitle } from './DocumentTitle';
import { FootNav } from './FootNav';
import { Panel } from './Panel';
import { ScreenHead } from './ScreenHead';
import { space } from './tokens';
import { useLook } from './useLook';

export interface ScreenSide {
  title?: string;
  /** At the right of the head, in ink2. */
  note?: string;
  back?: Href;
  /** At the right of the head: a switch of views, an icon. */
  action?: ReactNode;
  /** px on a desk; list 236 to 392, evidence 336 to 452 (560 from 1600 px on). */
  width?: number;
  content: ReactNode;
  /** Stays at the foot of the panel on a desk. */
  foot?: ReactNode;
}

export interface ScreenProps {
  title: string;
  subtitle?: string;
  /** Where the arrow at the left leads. */
  back?: Href;
  /** At the right of the head. */
  action?: ReactNode;
  /** The one thing that goes on: at the foot of a phone in place of the places, at the foot of the detail panel on a desk. */
  foot?: ReactNode;
  /** Left panel of a desk; a phone shows it on a route of its own. */
  list?: ScreenSide;
  /** Right panel of a desk; below the answer on a phone, beside it on a tablet. */
  evidence?: ScreenSide;
  /** Wavelength of the screen's bench; sets the rule and the accent. */
  wavelengthNm?: number | null;
  benchLabel?: string | null;
  /** False: children scroll themselves and fill the height. */
  scroll?: boolean;
  /** The detail panel of a desk has no head: its name stands over the list. */
  headless?: boolean;
  /** Detail panel's widest content on a desk, px, for forms and text. */
  measure?: number;
  children: ReactNode;
}

/** Frame of every screen inside the shell: one column on a phone, two on a tablet, panels that scroll apart on a desk. */
export function Screen({
  title,
  subtitle,
  back,
  action,
  foot,
  list,
  evidence,
  wavelengthNm = null,
  benchLabel = null,
  scroll = true,
  measure,
  headless,
  children,
}: ScreenProps) {
  const { colours, desk, layout } = useLook();
  useBenchLight(wavelengthNm, benchLabel);
  const name = <DocumentTitle title={title} />;

  if (desk) {
    const evidenceWidth = evidence?.width ?? 452;
    return (
      <View style={{ flex: 1, flexDirection: 'row', gap: space.hair, paddingLeft: space.hair, minHeight: 0 }}>
        {name}
        {list ? (
          <Panel
            title={list.title}
            note={list.note}
            back={list.back}
            action={list.action}
            foot={list.foot}
            width={list.width ?? 300}
            level={headless ? 1 : 2}
          >
            {list.content}
          </Panel>
        ) : null}
        <Panel
          title={headless ? undefined : title}
          note={subtitle}
          back={back}
          action={action}
          foot={foot}
          level={1}
          scroll={scroll}
          measure={measure}
          main
        >
          {children}
        </Panel>
        {evidence ? (
          <Panel
            title={evidence.title}
            note={evidence.note}
            action={evidence.action}
            foot={evidence.foot}
            width={layout === 'wide' ? Math.max(evidenceWidth, 560) : evidenceWidth}
            level={2}
          >
            {evidence.content}
          </Panel>
        ) : null}
      </View>
    );
  }

  const evidenceBlock = evidence ? (
    <View style={{ gap: space.hair }}>
      {evidence.title ? (
        <ScreenHead title={evidence.title} note={evidence.note} action={evidence.action} level={2} />
      ) : null}
      {evidence.content}
      {evidence.foot}
    </View>
  ) : null;
  const twoColumns = layout === 'tablet' && evidence !== undefined && scroll;
  return (
    <View style={{ flex: 1, minHeight: 0 }}>
      {name}
      <View role="main" style={{ flex: 1, minHeight: 0 }}>
        <ScreenHead title={title} subtitle={subtitle} back={back} action={action} level={1} />
        {scroll ? (
          <ScrollView
            tabIndex={0}
            style={{ flex: 1 }}
            contentContainerStyle={{ gap: space.hair, paddingBottom: space.xl }}
            keyboardShouldPersistTaps="handled"
          >
            {twoColumns ? (
              <View style={{ flexDirection: 'row', gap: space.hair, alignItems: 'flex-start' }}>
                <View style={{ flex: 1, minWidth: 0, gap: space.hair }}>{children}</View>
                <View style={{ width: Math.min(400, evidence.width ?? 400) }}>{evidenceBlock}</View>
              </View>
            ) : (
              <>
                {children}
                {evidenceBlock}
              </>
            )}
          </ScrollView>
        ) : (
          children
        )}
        {foot ? <View style={{ backgroundColor: colours.gap, paddingTop: space.hair }}>{foot}</View> : null}
      </View>
      {foot ? null : <FootNav />}
    </View>
  );
}
