import {
  createContext,
  type ReactElement,
  type ReactNode,
  useContext,
  useMemo,
  useState,
  useSyncExternalStore,
} from "react";

/** The place along a seam that several drawings point at together; null when nowhere. */
interface CursorStore {
  read(): number | null;
  write(station_mm: number | null): void;
  subscribe(listener: () => void): () => void;
}

function cursorStore(): CursorStore {
  let station_mm: number | null = null;
  const listeners = new Set<() => void>();
  return {
    read: () => station_mm,
    write(next) {
      if (next === station_mm) return;
      station_mm = next;
      for (const listener of listeners) listener();
    },
    subscribe(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}

const CursorContext = createContext<CursorStore | null>(null);

/** Joins the strips, plots and sections beneath it to one cursor. */
export function CursorProvider(props: { children: ReactNode }): ReactElement {
  const store = useMemo(cursorStore, []);
  return <CursorContext value={store}>{props.children}</CursorContext>;
}

/**
 * The cursor's station in mm, the way to move it, and whether it is shared. Alone, without a provider, a drawing has
 * its own, which goes when the pointer leaves; a shared one stays, as others show what is there.
 */
export function useStationCursor(): [number | null, (station_mm: number | null) => void, boolean] {
  const shared = useContext(CursorContext);
  const [own] = useState(cursorStore);
  const store = shared ?? own;
  return [useSyncExternalStore(store.subscribe, store.read, store.read), store.write, shared !== null];
}
