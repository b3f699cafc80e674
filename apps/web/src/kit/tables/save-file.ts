/** Gives the browser a file to keep. */
export function saveFile(bytes: Blob, fileName: string): void {
  const link = document.createElement("a");
  link.href = URL.createObjectURL(bytes);
  link.download = fileName;
  link.click();
  // The download begins after this turn; the address must live until then.
  setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
}

/** Gives the browser a text file to keep. The mark at the start lets spreadsheets read it as UTF-8. */
export function saveCsv(fileName: string, text: string): void {
  saveFile(new Blob(["\uFEFF", text], { type: "text/csv;charset=utf-8" }), fileName);
}
