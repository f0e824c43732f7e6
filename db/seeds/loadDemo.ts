/** The demo workshops of development: `npm start` loads them, production never does. */
import { demoContent } from './demo/content';
import { loadDemoContent } from './loadDemoContent';
import type { DemoResult } from './loadDemoContent';

/** Cost of the demo accounts' passwords, which stand in the documentation: there is nothing to protect. */
const BCRYPT_COST = 4;

/** Loads the demo, keeps it when nothing of it has changed, or makes it anew. */
export function loadDemo({ ownerUrl }: { ownerUrl: string }): Promise<DemoResult> {
  return loadDemoContent({ ownerUrl, content: demoContent, now: Date.now(), bcryptCost: BCRYPT_COST });
}
