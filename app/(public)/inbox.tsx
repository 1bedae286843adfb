import { useState } from 'react';
import { Linking, Platform, ScrollView, View } from 'react-native';
import { router } from 'expo-router';
import { Awaited } from '@/components/ui/Awaited';
import { DocumentTitle } from '@/components/ui/DocumentTitle';
import { EmptyState } from '@/components/ui/EmptyState';
import { MailText } from '@/components/ui/MailText';
import { Plate } from '@/components/ui/Plate';
import { Row } from '@/components/ui/Row';
import { ScreenHead } from '@/components/ui/ScreenHead';
import { Text } from '@/components/ui/Text';
import { useLook } from '@/components/ui/useLook';
import { useInbox } from '@/hooks/queries/account';
import { formatTime } from '@/shared/units/format';

/** Mail that the demo would have sent. It never leaves this machine. */
export default function InboxScreen() {
  const { widthPx, colours } = useLook();
  const inbox = useInbox();
  const [chosenId, setChosenId] = useState<string | null>(null);
  return (
    <View style={{ flex: 1, backgroundColor: colours.gap }}>
      <DocumentTitle title="Mail" />
      <ScreenHead title="Mail of the demo" subtitle="Caught on this machine, sent nowhere" back="/sign-in" level={1} />
      <ScrollView role="main" contentContainerStyle={{ gap: 2, paddingBottom: 24 }}>
        <Awaited
          result={inbox}
          what="the mail"
          isEmpty={(mails) => mails.length === 0}
          whenEmpty={
            <EmptyState sentence="No mail yet. Invite somebody or ask for a new password, and it arrives here." />
          }
        >
          {(mails) => {
            const wide = widthPx >= 900;
            const chosen = mails.find((mail) => mail.id === chosenId) ?? (wide ? mails[0] : undefined);
            const open = (mail: (typeof mails)[number]) => (
              <Plate surface="lift">
                <Text variant="section" level={2}>
                  {mail.subject}
                </Text>
                <Text variant="small" tone="ink2" style={{ marginBottom: 12 }}>
                  {`To ${mail.to}`}
                </Text>
                <MailText text={mail.text} onOpen={openLink} />
              </Plate>
            );
            return (
              <View style={wide ? { flexDirection: 'row', gap: 2 } : { gap: 2 }}>
                <View style={wide ? { width: 392, gap: 2 } : { gap: 2 }}>
                  {mails.map((mail) => (
                    <View key={mail.id} style={{ gap: 2 }}>
                      <Row
                        icon="mail"
                        title={mail.subject}
                        subtitle={`${formatTime(mail.receivedAt)}, to ${mail.to}`}
                        selected={chosen?.id === mail.id}
                        onPress={() => setChosenId(chosenId === mail.id && !wide ? null : mail.id)}
                      />
                      {!wide && chosen?.id === mail.id ? open(mail) : null}
                    </View>
                  ))}
                </View>
                {wide && chosen ? <View style={{ flex: 1 }}>{open(chosen)}</View> : null}
              </View>
            );
          }}
        </Awaited>
      </ScrollView>
    </View>
  );
}

/** Links of this application open in this tab, wherever the server believes that it stands. */
function openLink(address: string): void {
  const url = new URL(address);
  if (Platform.OS === 'web' && (url.pathname === '/reset' || url.pathname === '/invitation'))
    router.push(`${url.pathname}${url.search}` as '/reset');
  else void Linking.openURL(address);
}
