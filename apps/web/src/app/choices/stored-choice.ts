/** A small choice that this browser remembers, such as the theme; readable and changeable from anywhere. */
export interface StoredChoice<T extends string> {
  readonly key: string;
  readonly choices: readonly T[];
  read(): T;
  write(choice: T): void;
  subscribe(listener: () => void): () => void;
}

/** A choice kept under `key`; where storage is refused it lives as long as the page. The first choice is the default. */
export function storedChoice<T extends string>(key: string, choices: readonly [T, ...T[]]): StoredChoice<T> {
  const listeners = new Set<() => void>();
  let current: T | undefined;
  const read = (): T => {
    const kept = current ?? readStored(key);
    return choices.find((choice) => choice === kept) ?? choices[0];
  };
  return {
    key,
    choices,
    read,
    write(choice) {
      current = choice;
      writeStored(key, choice);
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

function readStored(key: string): string | null {
  try {
    return globalThis.localStorage?.getItem(key) ?? null;
  } catch {
    return null; // Storage is refused by the browser's settings.
  }
}

function writeStored(key: string, value: string): void {
  try {
    globalThis.localStorage?.setItem(key, value);
  } catch {
    // Storage is full or refused; the choice holds until the page is left.
  }
}
