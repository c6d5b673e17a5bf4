/** Hands a file to the browser to be saved. */
export function saveFile({ name, blob }: { name: string; blob: Blob }): void {
  const link = document.createElement("a");
  link.href = URL.createObjectURL(blob);
  link.download = name;
  document.body.append(link);
  link.click();
  link.remove();
  // The browser reads it after the click; a minute is enough for it to begin.
  setTimeout(() => URL.revokeObjectURL(link.href), 60_000);
}
