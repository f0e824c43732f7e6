/** Hands a file to the browser, which keeps it where the person wants it. */

/** JSON text under a name; characters that a file system may refuse become dashes. */
export function saveFile(name: string, json: string): void {
  const address = URL.createObjectURL(new Blob([json], { type: 'application/json' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = name.replace(/[^A-Za-z0-9._-]+/g, '-');
  link.click();
  URL.revokeObjectURL(address);
}
