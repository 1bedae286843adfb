import { createContext, useCallback, useContext, useEffect, useMemo, useState, type ReactNode } from 'react';

export interface Notice {
  text: string;
  /** What cannot wait is inverted and stays until it is closed. */
  urgent: boolean;
}

interface NoticeState {
  notice: Notice | null;
  /** Says in a line under the rule what has been done. Gone after eight seconds. */
  say: (text: string) => void;
  /** Says what cannot wait; stays until closed. */
  warn: (text: string) => void;
  close: () => void;
}

const NoticeContext = createContext<NoticeState>({
  notice: null,
  say: () => undefined,
  warn: () => undefined,
  close: () => undefined,
});

/** Holds the one notice of the screen; NoticeLine shows it. */
export function NoticeProvider({ children }: { children: ReactNode }) {
  const [notice, setNotice] = useState<Notice | null>(null);
  useEffect(() => {
    if (notice === null || notice.urgent) return undefined;
    const timer = setTimeout(() => setNotice(null), 8000);
    return () => clearTimeout(timer);
  }, [notice]);
  const say = useCallback((text: string) => setNotice({ text, urgent: false }), []);
  const warn = useCallback((text: string) => setNotice({ text, urgent: true }), []);
  const close = useCallback(() => setNotice(null), []);
  const state = useMemo(() => ({ notice, say, warn, close }), [notice, say, warn, close]);
  return <NoticeContext.Provider value={state}>{children}</NoticeContext.Provider>;
}

export function useNotice(): NoticeState {
  return useContext(NoticeContext);
}
