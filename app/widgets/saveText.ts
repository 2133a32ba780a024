/** Hands the person a text as a file to keep. */
export function saveText(fileName: string, text: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  // The browser reads the address after this turn of its event loop.
  setTimeout(() => URL.revokeObjectURL(address), 1000);
}
