import { Slot } from 'expo-router';
import { SafeAreaProvider } from 'react-native-safe-area-context';
import { GlobalStyle } from '@/components/ui/GlobalStyle';
import { NoticeProvider } from '@/components/ui/NoticeProvider';
import { QueriesOfSession } from '@/hooks/session/QueriesOfSession';
import { SessionProvider } from '@/hooks/session/SessionProvider';
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
                <Slot />
              </NoticeProvider>
            </QueriesOfSession>
          </SessionProvider>
        ) : null}
      </ThemeProvider>
    </SafeAreaProvider>
  );
}
