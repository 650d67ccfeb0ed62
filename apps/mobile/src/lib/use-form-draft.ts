import { del, get, set } from 'idb-keyval';
import { useEffect } from 'react';
import type { FieldValues, UseFormReturn } from 'react-hook-form';

/**
 * Keeps a form on this device with every change, and brings it back when the page was closed or loaded anew before it was saved.
 *
 * @param key what the form is about: "cable of <structure>"
 * @returns what to call once it is saved
 */
export function useFormDraft<Values extends FieldValues>(form: UseFormReturn<Values>, key: string): () => void {
  const storageKey = `strandnote.form ${key}`;
  useEffect(() => {
    let current = true;
    get<Values>(storageKey).then((found) => {
      // What was typed before the store answered is newer than what is stored.
      if (current && found !== undefined && !form.formState.isDirty) form.reset(found, { keepDefaultValues: true });
    });
    const subscription = form.watch((values) => void set(storageKey, values));
    return () => {
      current = false;
      subscription.unsubscribe();
    };
  }, [form, storageKey]);
  return () => void del(storageKey);
}
