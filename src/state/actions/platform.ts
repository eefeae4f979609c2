/** What the store needs of the browser, so that it can be tested without one. */
export interface Platform {
  readonly pageAddress: () => string;
  /** False where the browser refuses. */
  readonly copy: (text: string) => Promise<boolean>;
  readonly download: (fileName: string, content: Blob) => void;
  /** Text of one of the invented examples by its file name; null where it cannot be had. */
  readonly exampleByName: (name: string) => Promise<string | null>;
  readonly exampleByHash: (fileHash: string) => Promise<{ readonly fileName: string; readonly text: string } | null>;
}

interface ExampleEntry {
  readonly file: string;
  readonly sha: string;
}

const folder = 'examples/';

async function fetchText(path: string): Promise<string | null> {
  try {
    const response = await fetch(path);
    return response.ok ? await response.text() : null;
  } catch {
    return null;
  }
}

async function exampleIndex(): Promise<readonly ExampleEntry[]> {
  const text = await fetchText(`${folder}index.json`);
  return text === null ? [] : (JSON.parse(text) as ExampleEntry[]);
}

/** The browser itself. */
export const browserPlatform: Platform = {
  pageAddress: () => location.href.replace(/#.*$/, ''),
  copy: async (text) => {
    try {
      await navigator.clipboard.writeText(text);
      return true;
    } catch {
      return false;
    }
  },
  download: (fileName, content) => {
    const link = document.createElement('a');
    link.href = URL.createObjectURL(content);
    link.download = fileName;
    link.click();
    setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
  },
  exampleByName: (name) => fetchText(folder + name),
  exampleByHash: async (fileHash) => {
    const entry = (await exampleIndex()).find(({ sha }) => sha === fileHash);
    if (entry === undefined) return null;
    const text = await fetchText(folder + entry.file);
    return text === null ? null : { fileName: entry.file, text };
  },
};
