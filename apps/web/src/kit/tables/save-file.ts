/** Gives the browser a text file to keep. The mark at the start lets spreadsheets read it as UTF-8. */
export function saveCsv(fileName: string, text: string): void {
  const url = URL.createObjectURL(new Blob(["\uFEFF", text], { type: "text/csv;charset=utf-8" }));
  const link = document.createElement("a");
  link.href = url;
  link.download = fileName;
  link.click();
  URL.revokeObjectURL(url);
}
