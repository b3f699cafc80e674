import { useEffect, useState } from "react";
import { flushSync } from "react-dom";

/** Whether the page is being printed: then a table draws all its rows, not only those in view. */
export function usePrinting(): boolean {
  const [isPrinting, setPrinting] = useState(false);
  // The browser asks for paper outside React and takes the page as it stands when the event returns.
  useEffect(() => {
    const begin = () => flushSync(() => setPrinting(true));
    const end = () => setPrinting(false);
    addEventListener("beforeprint", begin);
    addEventListener("afterprint", end);
    return () => {
      removeEventListener("beforeprint", begin);
      removeEventListener("afterprint", end);
    };
  }, []);
  return isPrinting;
}
