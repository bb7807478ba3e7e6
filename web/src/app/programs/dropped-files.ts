/** Files out of a drop. A folder is no file: its name is given back, to be told about. */
export function readDropped(data: DataTransfer | null): {
  readonly files: readonly File[];
  readonly folders: readonly string[];
} {
  const files: File[] = [];
  const folders: string[] = [];
  for (const item of Array.from(data?.items ?? [])) {
    if (item.kind !== 'file') continue;
    const entry = item.webkitGetAsEntry();
    const file = item.getAsFile();
    if (entry?.isDirectory) folders.push(entry.name);
    else if (file) files.push(file);
  }
  return { files, folders };
}
