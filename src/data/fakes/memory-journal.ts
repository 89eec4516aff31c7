import type { JournalFiles } from '../ports/ports';

export interface MemoryJournal {
  readonly files: JournalFiles;
  readonly text: (folder: string, name: string) => string | undefined;
  readonly setText: (folder: string, name: string, text: string) => void;
  /** From now on every write fails. */
  readonly breakDown: () => void;
}

/** Journal files in memory; what was appended survives the tab, as a flushed file does. */
export function memoryJournal(): MemoryJournal {
  const folders = new Map<string, Map<string, string>>();
  const open = new Set<string>();
  let broken = false;
  const folderOf = (folder: string) => {
    const files = folders.get(folder) ?? new Map<string, string>();
    folders.set(folder, files);
    return files;
  };
  const files: JournalFiles = {
    folders: () => Promise.resolve([...folders.keys()]),
    list: (folder) => Promise.resolve([...folderOf(folder).keys()]),
    read: (folder, name) => {
      const text = folderOf(folder).get(name);
      return text === undefined ? Promise.reject(new Error('no such file')) : Promise.resolve(text);
    },
    create: (folder, name) => {
      const path = `${folder}/${name}`;
      if (broken || open.has(path)) return Promise.reject(new Error('the file cannot be opened'));
      open.add(path);
      if (!folderOf(folder).has(name)) folderOf(folder).set(name, '');
      return Promise.resolve({
        append: (text) => {
          if (broken) return Promise.reject(new Error('the disk does not answer'));
          folderOf(folder).set(name, (folderOf(folder).get(name) ?? '') + text);
          return Promise.resolve();
        },
        close: () => {
          open.delete(path);
          return Promise.resolve();
        },
      });
    },
    remove: (folder, name) => {
      folderOf(folder).delete(name);
      return Promise.resolve();
    },
  };
  return {
    files,
    text: (folder, name) => folders.get(folder)?.get(name),
    setText: (folder, name, text) => {
      folderOf(folder).set(name, text);
    },
    breakDown: () => {
      broken = true;
    },
  };
}
