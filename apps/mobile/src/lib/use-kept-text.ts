import { del, get, set } from 'idb-keyval';
import { useEffect, useRef, useState } from 'react';

/**
 * Something that is being typed, kept on this device with every change until it is saved: a closed tab, an ended session or a
 * restarted server loses nothing. A change of `key` (a saved version, another record) begins again from `saved`.
 */
export function useKeptText<Value>(key: string, saved: Value) {
  const storageKey = `strandnote.kept ${key}`;
  const [value, setValue] = useState(saved);
  const typed = useRef(false);
  // biome-ignore lint/correctness/useExhaustiveDependencies: a new object with the same content is no reason to begin again
  useEffect(() => {
    typed.current = false;
    setValue(saved);
    let current = true;
    get<Value>(storageKey).then((found) => {
      // What was typed before the store answered is newer than what is stored.
      if (current && found !== undefined && !typed.current) setValue(found);
    });
    return () => {
      current = false;
    };
  }, [storageKey]);
  return {
    value,
    change(next: Value) {
      typed.current = true;
      setValue(next);
      void set(storageKey, next);
    },
    forget() {
      void del(storageKey);
    },
  };
}
