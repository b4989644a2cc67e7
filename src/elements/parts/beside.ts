/** Address of the script file that this code came in, which only its first run can tell; undefined for ES modules. */
export const script = typeof document === 'undefined' ? undefined : (document.currentScript as HTMLScriptElement | null)?.src;

/** Address of a file that lies beside the script file, as a page that requires trusted types takes it. */
export function beside(file: string): string {
  const address = new URL(file, script).href;
  const { trustedTypes } = globalThis as { trustedTypes?: TrustedTypes };
  policy ??= trustedTypes?.createPolicy('esterway', { createScriptURL: (url) => url });
  return (policy?.createScriptURL(address) ?? address) as string;
}

/**
 * Runs a script that lies beside the script file; what it gives stands on the shelf.
 *
 * @throws where there is no such file, or the page does not let it run
 */
export function runBeside(file: string): Promise<void> {
  return new Promise((done, failed) => {
    const element = document.createElement('script');
    element.src = beside(file);
    element.addEventListener('load', () => done());
    element.addEventListener('error', () => failed(new Error(`${file} could not be fetched`)));
    document.head.append(element);
    element.remove();
  });
}

/** What the script file and the files beside it give one another; the first copy on a page makes it. */
export interface Shelf {
  /** Runs a file once; what it gives stands in `files`. */
  readonly run: (file: string) => Promise<void>;
  /** By the name of the file: what it gives, once what it needs itself is there. */
  readonly files: Record<string, Promise<object> | undefined>;
}

/** Only where the code came in a script file. */
export const shelf: Shelf | undefined = script === undefined ? undefined : ((globalThis as { esterwayParts?: Shelf }).esterwayParts ??= { run: runBeside, files: {} });

interface TrustedTypes {
  createPolicy(name: string, rules: { createScriptURL(url: string): string }): { createScriptURL(url: string): unknown };
}

let policy: ReturnType<TrustedTypes['createPolicy']> | undefined;
