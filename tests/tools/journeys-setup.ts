import type { TestProject } from 'vitest/node';
import { startDemo } from './site-server.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    /** Address of the demo pages while the journeys run: `inject('demoUrl')`. */
    demoUrl: string;
  }
}

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const demo = await startDemo();
  project.provide('demoUrl', demo.url);
  return () => demo.close();
}
