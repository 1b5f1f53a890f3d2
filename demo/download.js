/** Hands a text to the person as a file. */
export function download(name, type, text) {
  const address = URL.createObjectURL(new Blob([text], { type }));
  const link = document.createElement('a');
  link.href = address;
  link.download = name;
  link.click();
  // The browser reads the address after the click has returned.
  setTimeout(() => URL.revokeObjectURL(address), 10_000);
}

export const downloadJson = (name, value) => download(name, 'application/json', `${JSON.stringify(value, null, 2)}\n`);
