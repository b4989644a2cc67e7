/** Hands a text to the browser to be saved as a file. */
export function saveFile(name: string, text: string): void {
  const address = URL.createObjectURL(new Blob([text], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  // some browsers read it only after the click has been handled
  setTimeout(() => URL.revokeObjectURL(address), 60_000);
}
