import { Slot } from 'expo-router';
import { SafeAreaProvider } from 'react-native-safe-area-context';
import { GlobalStyle } from '@/components/ui/GlobalStyle';
import { NoticeProvider } from '@/components/ui/NoticeProvider';
import { WaitingForServer } from '@/components/ui/WaitingForServer';
import { QueriesOfSession } from '@/hooks/session/QueriesOfSession';
import { SessionProvider, useSession } from '@/hooks/session/SessionProvider';
import { ThemeProvider } from '@/hooks/theme/ThemeProvider';
import { useFonts } from '@/hooks/theme/useFonts';

export default function RootLayout() {
  const fontsReady = useFonts();
  return (
    <SafeAreaProvider>
      <ThemeProvider>
        <GlobalStyle />
        {fontsReady ? (
          <SessionProvider>
            <QueriesOfSession>
              <NoticeProvider>
                <Screens />
              </NoticeProvider>
            </QueriesOfSession>
          </SessionProvider>
        ) : null}
      </ThemeProvider>
    </SafeAreaProvider>
  );
}

/** No screen is drawn before it is known who is signed in, so that the address is still the one that was asked for. */
function Screens() {
  const { state, actions } = useSession();
  if (state.status === 'asking') return <WaitingForServer problem={null} onRetry={actions.retry} />;
  if (state.status === 'unreachable') return <WaitingForServer problem={state.problem} onRetry={actions.retry} />;
  return <Slot />;
}
