import { useEffect, useRef, useState } from 'react';
import type { DefaultValues, FieldValues, UseFormReturn } from 'react-hook-form';
import { currentSession } from '@/hooks/api/accessToken';
import { readDraft, warnBeforeLeaving, writeDraft } from './draftStore';

export interface Draft {
  /** What was typed before has been put back. */
  restored: boolean;
  /** Drops what was typed and shows what is stored. */
  discard: () => void;
  /** After saving: nothing is left to keep. */
  saved: () => void;
}

/**
 * Keeps what is typed into a form until it is saved or discarded, so that the back button, a link or a reload lose
 * nothing; the browser also asks before the tab is closed. Not for forms with passwords.
 * @param name of the form, with the id of what it changes
 */
export function useDraft<V extends FieldValues, C, O>(name: string, form: UseFormReturn<V, C, O>): Draft {
  const key = `${currentSession()?.membership.id ?? 'nobody'}.${name}`;
  const [restored, setRestored] = useState(false);
  const done = useRef(false);

  useEffect(() => {
    done.current = false;
    const text = readDraft(key);
    if (text !== null) {
      try {
        form.reset(JSON.parse(text) as DefaultValues<V>, { keepDefaultValues: true });
        setRestored(true);
      } catch {
        writeDraft(key, null);
      }
    }
    const stopKeeping = form.subscribe({
      formState: { values: true, isDirty: true },
      callback: ({ values, isDirty }) => {
        if (!done.current) writeDraft(key, isDirty ? JSON.stringify(values) : null);
      },
    });
    const stopWarning = warnBeforeLeaving(() => !done.current && readDraft(key) !== null);
    return () => {
      stopKeeping();
      stopWarning();
    };
  }, [key, form]);

  return {
    restored,
    discard: () => {
      form.reset();
      writeDraft(key, null);
      setRestored(false);
    },
    saved: () => {
      done.current = true;
      writeDraft(key, null);
    },
  };
}
