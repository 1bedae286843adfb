import { createContext, useCallback, useContext, useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import { accountEndpoints, type Session } from '@/shared/contracts/accounts';
import type { BodyInputOf } from '@/shared/contracts/endpoint';
import type { Role } from '@/shared/contracts/roles';
import { currentSession, keepSession, onSessionChange, renewAccessToken } from '@/hooks/api/accessToken';
import { ApiProblem } from '@/hooks/api/ApiProblem';
import { call } from '@/hooks/api/call';
import { announceSessionChange, onSessionChangeElsewhere } from './otherTabs';

/** `asking`: the refresh cookie is being tried; `unreachable`: the server did not answer. */
export type SessionState =
  | { status: 'asking' }
  | { status: 'unreachable'; problem: ApiProblem }
  /** `byHand`: the person signed out in this tab, so that the next one does not land on their screen. */
  | { status: 'signed-out'; byHand: boolean }
  | { status: 'signed-in'; session: Session };

export interface SessionActions {
  signIn: (body: BodyInputOf<typeof accountEndpoints.signIn>) => Promise<void>;
  register: (body: BodyInputOf<typeof accountEndpoints.register>) => Promise<void>;
  accept: (body: BodyInputOf<typeof accountEndpoints.acceptInvitation>) => Promise<void>;
  /** Ends the session in every tab of this browser. */
  signOut: () => Promise<void>;
  switchLaboratory: (laboratoryId: string) => Promise<void>;
  /** Asks for the session again, after the server did not answer. */
  retry: () => void;
}

const SessionContext = createContext<{ state: SessionState; actions: SessionActions } | null>(null);

/** Knows who is signed in. On load the refresh cookie brings the session back. */
export function SessionProvider({ children }: { children: ReactNode }) {
  const [state, setState] = useState<SessionState>(() => {
    const session = currentSession();
    return session ? { status: 'signed-in', session } : { status: 'asking' };
  });

  const leaving = useRef(false);

  const ask = useCallback(() => {
    renewAccessToken().catch((error: unknown) => {
      const problem =
        error instanceof ApiProblem
          ? error
          : new ApiProblem('unexpected', 'The server gave an answer that cannot be read.', null, {}, null);
      setState((now) => (now.status === 'signed-in' ? now : { status: 'unreachable', problem }));
    });
  }, []);

  useEffect(() => {
    const stop = onSessionChange((session) => {
      setState(session ? { status: 'signed-in', session } : { status: 'signed-out', byHand: leaving.current });
      leaving.current = false;
    });
    const stopElsewhere = onSessionChangeElsewhere((change) => {
      if (change === 'signed-out') keepSession(null);
      else ask();
    });
    if (currentSession() === null) ask();
    return () => {
      stop();
      stopElsewhere();
    };
  }, [ask]);

  const actions = useMemo<SessionActions>(() => {
    const begin = (session: Session) => {
      keepSession(session);
      announceSessionChange('signed-in');
    };
    return {
      signIn: async (body) => begin(await call(accountEndpoints.signIn, { body })),
      register: async (body) => begin(await call(accountEndpoints.register, { body })),
      accept: async (body) => begin(await call(accountEndpoints.acceptInvitation, { body })),
      signOut: async () => {
        await call(accountEndpoints.signOut);
        leaving.current = true;
        keepSession(null);
        announceSessionChange('signed-out');
      },
      switchLaboratory: async (laboratoryId) =>
        begin(await call(accountEndpoints.switchLaboratory, { body: { laboratoryId } })),
      retry: () => {
        setState({ status: 'asking' });
        ask();
      },
    };
  }, [ask]);

  const value = useMemo(() => ({ state, actions }), [state, actions]);
  return <SessionContext.Provider value={value}>{children}</SessionContext.Provider>;
}

export function useSession(): { state: SessionState; actions: SessionActions } {
  const value = useContext(SessionContext);
  if (value === null) throw new Error('useSession needs a SessionProvider');
  return value;
}

/** The session of a screen behind the sign-in. */
export function useSignedIn(): Session {
  const { state } = useSession();
  if (state.status !== 'signed-in') throw new Error('useSignedIn is for screens behind the sign-in');
  return state.session;
}

export function useRole(): Role {
  return useSignedIn().membership.role;
}
